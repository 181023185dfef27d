import type { UnitSystem } from "@/lib/airflow/units/units";
import type { IssuedDocument } from "@/lib/records/issuedDocument";
import type { Sheet } from "./sheet";

export interface CertificateOptions {
  /** Where the record can be verified. */
  verifyUrl: string;
  status: "issued" | "superseded" | "void";
  /** Id of the record that replaced this one. */
  supersededBy?: string | null;
  voidReason?: string | null;
  signingKeyId: string;
}

/** What every section is drawn from. */
export interface Context {
  sheet: Sheet;
  document: IssuedDocument;
  options: CertificateOptions;
  system: UnitSystem;
}
