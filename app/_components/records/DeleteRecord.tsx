"use client";

import { useRouter } from "next/navigation";
import { ConfirmButton } from "../actions/ConfirmButton";
import { postToPortal } from "../forms/postToPortal";

interface DeleteRecordProps {
  /** Route below /api/portal. */
  path: string;
  /** "project". */
  what: string;
  name: string;
  consequence: string;
  /** The list it was in. */
  back: string;
}

/** Deletes something stored, after asking; says why where it cannot be. */
export function DeleteRecord({ path, what, name, consequence, back }: DeleteRecordProps) {
  const router = useRouter();
  return (
    <div>
      <ConfirmButton
        label={`Delete the ${what}`}
        title={`Delete the ${what} ${name}?`}
        consequence={consequence}
        confirmLabel={`Delete the ${what}`}
        onConfirm={async () => {
          await postToPortal(path);
          router.push(back);
          router.refresh();
        }}
      />
    </div>
  );
}
