import { Notice } from "@/app/_components/layout/Notice";
import type { RecordState } from "@/lib/records/verifyRecord";

const ALTERED: Record<Extract<RecordState, { valid: false }>["reason"], string> = {
  signature_does_not_match: "The signature does not cover the document as it is stored now.",
  record_differs_from_document: "The stored record is not what the signed document says.",
  unknown_key: "The key that it names is none of ours.",
  not_a_jws: "What is stored as its signature is none.",
};

/** Whether the record is as it was signed, before anything else. */
export function Outcome({ state }: { state: RecordState }) {
  if (state.valid) {
    return (
      <Notice kind="good" title="The record is as it was signed">
        Its signature was checked just now against the published keys, and nothing in it has been changed since it was issued.
      </Notice>
    );
  }
  return (
    <Notice kind="failure" title="This record was altered">
      {ALTERED[state.reason]} Do not rely on any figure below; ask whoever gave you the certificate.
    </Notice>
  );
}
