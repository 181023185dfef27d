"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { TextArea } from "@/app/_components/forms/TextArea";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";
import { Notice } from "@/app/_components/layout/Notice";
import type { Project } from "@/lib/records/projects";

const text = (fields: FormData, name: string): string | null => String(fields.get(name)).trim() || null;

const bodyOf = (fields: FormData): unknown => ({
  name: String(fields.get("name")), number: text(fields, "number"), location: text(fields, "location"), notes: text(fields, "notes"),
});

/** Makes a project, or changes one. */
export function ProjectForm({ project }: { project?: Project }) {
  const router = useRouter();
  const [changed, setChanged] = useState(false);
  const form = usePortalForm<{ id: string }>(project ? `projects/${project.id}/change` : "projects", bodyOf, ({ id }) => {
    if (!project) router.push(`/projects/${id}`);
    setChanged(project !== undefined);
    router.refresh();
  });
  return (
    <form onSubmit={form.submit} noValidate className="grid max-w-2xl gap-4">
      <FormErrors errors={form.errors} title={project ? "The project was not changed" : "The project was not made"} />
      {changed && form.errors.length === 0 && <Notice kind="good" title="Changed" live>What was issued keeps the project as it was on the day.</Notice>}
      <TextInput name="name" label="Name" required maxLength={160} defaultValue={project?.name} error={form.errorOf("name")} />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextInput name="number" label="Number (optional)" hint="The firm's own." maxLength={60} defaultValue={project?.number ?? ""} error={form.errorOf("number")} />
        <TextInput name="location" label="Location (optional)" hint="Where the building is." maxLength={300} defaultValue={project?.location ?? ""} error={form.errorOf("location")} />
      </div>
      <TextArea name="notes" label="Notes (optional)" rows={3} maxLength={4000} defaultValue={project?.notes ?? ""} error={form.errorOf("notes")} />
      <div>
        <Button type="submit" variant="primary" pending={form.pending}>
          {project ? "Change the project" : "Make the project"}
        </Button>
      </div>
    </form>
  );
}
