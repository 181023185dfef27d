"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { ConfirmButton } from "@/app/_components/actions/ConfirmButton";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { postToPortal } from "@/app/_components/forms/postToPortal";
import { Select } from "@/app/_components/forms/Select";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";
import { Card } from "@/app/_components/layout/Card";
import { NewKey } from "../NewKey";

const OVERLAPS = [
  { value: "0", label: "Stop the old key at once" },
  { value: "1", label: "Both work for an hour" },
  { value: "24", label: "Both work for a day" },
  { value: "168", label: "Both work for a week" },
];

interface KeyActionsProps {
  id: string;
  name: string;
  canRotate: boolean;
  baseUrl: string;
  /** What depends on the key, in a sentence. */
  lastUse: string;
}

/** What can be done with a key that works: rotate it, revoke it. */
export function KeyActions({ id, name, canRotate, baseUrl, lastUse }: KeyActionsProps) {
  const router = useRouter();
  const [successor, setSuccessor] = useState<string | null>(null);
  const form = usePortalForm<{ text: string }>(`keys/${id}/rotate`, (fields) => ({ overlapHours: Number(fields.get("overlapHours")) }), ({ text }) => setSuccessor(text));
  if (successor) return <NewKey text={successor} baseUrl={baseUrl} />;
  const revoke = async (): Promise<void> => {
    await postToPortal(`keys/${id}/revoke`);
    router.refresh();
  };
  return (
    <div className="grid gap-5 lg:grid-cols-2">
      {canRotate && (
        <Card title="Rotate">
          <form onSubmit={form.submit} className="grid gap-4">
            <FormErrors errors={form.errors} title="The key was not rotated" />
            <p className="text-muted">Makes a successor with the same settings. Put it in place while both work.</p>
            <Select name="overlapHours" label="Overlap" choices={OVERLAPS} defaultValue="24" />
            <div>
              <Button type="submit" pending={form.pending}>
                Rotate the key
              </Button>
            </div>
          </form>
        </Card>
      )}
      <Card title="Revoke">
        <p className="mb-4 text-muted">Stops the key for good, everywhere within 5 seconds.</p>
        <ConfirmButton
          label="Revoke the key"
          title={`Revoke the key ${name}?`}
          consequence={`${lastUse} Every program that uses it is refused from then on. This cannot be undone.`}
          confirmLabel="Revoke the key"
          onConfirm={revoke}
        />
      </Card>
    </div>
  );
}
