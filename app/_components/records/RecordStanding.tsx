import type { TraverseSummary } from "@/lib/records/traverses/answer";
import { Status } from "../layout/Status";

const STANDING = { draft: "information", issued: "good", superseded: "caution", void: "failure" } as const;
const WORD = { draft: "Draft", issued: "Issued", superseded: "Superseded", void: "Void" } as const;

/** The state of a stored traverse. */
export const RecordStanding = ({ status }: { status: TraverseSummary["status"] }) => <Status standing={STANDING[status]}>{WORD[status]}</Status>;

const VERDICT = { within: "good", outside: "failure", undecided: "caution" } as const;
const VERDICT_WORD = { within: "within", outside: "outside", undecided: "undecided" } as const;

/** What the measurement says of the design. */
export const VerdictStanding = ({ verdict }: { verdict: NonNullable<TraverseSummary["verdict"]> }) => <Status standing={VERDICT[verdict]}>{VERDICT_WORD[verdict]}</Status>;
