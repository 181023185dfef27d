import Link from "next/link";
import { Time } from "@/app/_components/format/Time";
import { Notice } from "@/app/_components/layout/Notice";
import type { VerifiedRecord } from "@/lib/records/verifyRecord";

/** What has become of the record since it was issued; nothing where it still stands. */
export function Standing({ record: { status, supersededBy, voided } }: { record: VerifiedRecord }) {
  if (voided) {
    return (
      <Notice kind="failure" title="Void">
        Withdrawn on <Time value={voided.at} style="date" />: {voided.reason}
      </Notice>
    );
  }
  if (status === "superseded") {
    return (
      <Notice kind="caution" title="Superseded">
        A later revision stands in its place{supersededBy && <>: <Link href={`/verify/${supersededBy}`}>{supersededBy}</Link></>}.
      </Notice>
    );
  }
  return null;
}
