import { useState } from "react";
import type { AirflowInput } from "@/lib/airflow/calculations/airflow";
import type { Face } from "@/lib/airflow/layout/line";
import { Button } from "../actions/Button";
import { LinkButton } from "../actions/LinkButton";
import { FormErrors } from "../forms/FormErrors";
import { Select } from "../forms/Select";
import { TextInput } from "../forms/TextInput";
import { usePortalForm } from "../forms/usePortalForm";
import { Notice } from "../layout/Notice";

interface SaveAsRecordProps {
  projects: { id: string; name: string }[];
  request: AirflowInput | null;
  enterFrom: Face;
}

/** Keeps the sheet as a draft among the records. */
export function SaveAsRecord({ projects, request, enterFrom }: SaveAsRecordProps) {
  const [saved, setSaved] = useState<string | null>(null);
  const form = usePortalForm<{ id: string }>(
    "bench/save",
    (fields) => ({ projectId: fields.get("projectId"), system: String(fields.get("system")).trim() || null, request, enterFrom }),
    ({ id }) => setSaved(id),
  );
  if (projects.length === 0) return <p className="text-muted">To keep it as a record, make a project first.</p>;
  return (
    <form onSubmit={form.submit} noValidate className="grid gap-3">
      <FormErrors errors={form.errors} title="It was not kept" />
      {saved && (
        <Notice kind="good" title="Kept as a draft" live>
          <LinkButton href={`/records/${saved}`}>To the record</LinkButton>
        </Notice>
      )}
      <div className="grid gap-3 sm:grid-cols-2">
        <Select name="projectId" label="Project" choices={projects.map(({ id, name }) => ({ value: id, label: name }))} />
        <TextInput name="system" label="System" maxLength={120} placeholder="AHU-1" />
      </div>
      <div>
        <Button type="submit" pending={form.pending} disabled={request === null}>
          Keep as a record
        </Button>
      </div>
    </form>
  );
}
