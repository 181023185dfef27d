import { Time } from "@/app/_components/format/Time";
import { Status } from "@/app/_components/layout/Status";
import type { KeyStatus } from "@/lib/keys/listKeys";

/** How a key stands, and until when. */
export function KeyStanding({ status, expiresAt, isReplaced }: { status: KeyStatus; expiresAt: Date | null; isReplaced: boolean }) {
  if (status === "revoked") return <Status standing="failure">Revoked</Status>;
  if (status === "expired") return <Status standing="failure">Expired</Status>;
  if (isReplaced) return <Status standing="caution">Replaced, works until <Time value={expiresAt} /></Status>;
  return <Status standing="good">Active{expiresAt && <>, until <Time value={expiresAt} style="date" /></>}</Status>;
}
