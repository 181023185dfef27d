import type { z } from "zod";
import type { importAnswer } from "@/api-spec/records/imports";

export type ImportReport = z.output<typeof importAnswer>;
export type ImportFault = ImportReport["faults"][number];

/** Thrown where a file cannot be read any further. */
export class UnreadableFile extends Error {
  constructor(readonly fault: ImportFault) {
    super(fault.detail);
    this.name = "UnreadableFile";
  }
}
