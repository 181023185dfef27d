"use client";

import { useRouter } from "next/navigation";
import { Button } from "@/app/_components/actions/Button";
import { ConfirmButton } from "@/app/_components/actions/ConfirmButton";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { postToPortal } from "@/app/_components/forms/postToPortal";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";
import { DeleteRecord } from "@/app/_components/records/DeleteRecord";

interface RecordActionsProps {
  id: string;
  name: string;
  status: "draft" | "issued";
  isReady: boolean;
}

/** What can be done with a draft, or with a record that stands. */
export function RecordActions({ id, name, status, isReady }: RecordActionsProps) {
  const router = useRouter();
  if (status === "draft") {
    return (
      <div className="no-print flex flex-wrap gap-2">
        <ConfirmButton
          variant="primary"
          label="Issue"
          title={`Issue ${name}?`}
          consequence="It is signed and cannot be changed any more. A correction is a new revision."
          confirmLabel="Issue the traverse"
          disabled={!isReady}
          onConfirm={async () => {
            await postToPortal(`records/${id}/issue`);
            router.refresh();
          }}
        />
        <DeleteRecord path={`records/${id}/delete`} what="draft" name={name} consequence="Its readings and attachments go with it. This cannot be undone." back="/records" />
      </div>
    );
  }
  return (
    <div className="no-print grid gap-4 md:grid-cols-2">
      <div>
        <p className="mb-2 text-muted">A correction is a new draft with everything this record has. Once issued, it supersedes this one.</p>
        <ConfirmButton
          variant="plain"
          label="Begin a revision"
          title={`Begin a revision of ${name}?`}
          consequence="This record stands until the revision is issued."
          confirmLabel="Begin the revision"
          onConfirm={async () => router.push(`/records/${(await postToPortal<{ id: string }>(`records/${id}/revise`)).id}`)}
        />
      </div>
      <VoidForm id={id} />
    </div>
  );
}

function VoidForm({ id }: { id: string }) {
  const router = useRouter();
  const form = usePortalForm(`records/${id}/void`, (fields) => ({ reason: String(fields.get("reason")) }), () => router.refresh());
  return (
    <form onSubmit={form.submit} noValidate className="grid gap-2">
      <FormErrors errors={form.errors} title="The record was not voided" />
      <TextInput name="reason" label="Reason to void it" hint="Shown to everyone who looks at the record. It cannot be undone." required maxLength={1000} error={form.errorOf("reason")} />
      <div>
        <Button type="submit" variant="danger" pending={form.pending}>
          Void the record
        </Button>
      </div>
    </form>
  );
}
