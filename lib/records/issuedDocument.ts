import type { AirflowAnswer, AirflowInput } from "@/lib/airflow/calculations/airflow";
import type { PlanInput } from "@/lib/airflow/layout/plan";
import type { Environment } from "@/lib/keys/keyText";

/** An instrument as it was on the day: what the certificate says of it. */
export interface InstrumentSnapshot {
  id: string;
  name: string;
  manufacturer: string | null;
  model: string | null;
  serialNumber: string | null;
  /** The calibration in force on the day the traverse was taken; null where there was none. */
  calibration: {
    id: string;
    calibratedOn: string;
    dueOn: string;
    laboratory: string | null;
    certificateNumber: string | null;
  } | null;
}

/** What was measured, exactly as the engine was given it, and the plan's own fields with it. */
export type Measurement = AirflowInput & Pick<PlanInput, "points" | "enterFrom">;

/**
 * An issued traverse as it is signed: everything that the certificate and the verification page say, and nothing else.
 * Its canonical JSON (RFC 8785) is what the signature covers. A later form gets another `format`; old ones stay valid.
 */
export interface IssuedDocument {
  format: "averduct/traverse/1";
  id: string;
  environment: Environment;
  revision: number;
  /** Id of the traverse that this one replaces; null for a first issue. */
  supersedes: string | null;
  organisation: { id: string; name: string };
  project: { id: string; name: string; number: string | null; location: string | null };
  system: string | null;
  location: string | null;
  technician: string;
  /** ISO 8601, UTC. */
  takenAt: string;
  issuedAt: string;
  notes: string | null;
  holes: { count: number; sealed: boolean; method: string | null };
  instrument: InstrumentSnapshot | null;
  /** Why the traverse was issued without an instrument in calibration; null where it was in calibration. */
  calibrationWaiver: { reason: string } | null;
  measurement: Measurement;
  /** With its working. */
  result: AirflowAnswer;
  engineVersion: string;
}
