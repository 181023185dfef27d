import type { RecordContext } from "../context";
import { dayOf } from "../instruments";
import { noSuchReference } from "../noSuchRecord";
import { projects } from "../projects";
import { datedInstrument, type DatedInstrument } from "./datedInstrument";

/** What traverses refer to. Throws the problem where it is not there. */
export interface References {
  requireProject(id: string): Promise<void>;
  /** The instrument as it was on the day; null where none is named. */
  instrument(id: string | null, takenAt: Date | null): Promise<DatedInstrument | null>;
}

/** The references of one or of many traverses, each looked up once. */
export function referencesOf(context: Pick<RecordContext, "db" | "realm">): References {
  const project = once(async (id: string) => {
    if (!(await projects(context).where("projects.id", id).first("projects.id"))) throw noSuchReference("/projectId", "project");
  });
  const instrument = once(async (id: string, day: string) => datedInstrument(context, id, day ? new Date(day) : null));
  return {
    requireProject: (id) => project(id),
    instrument: async (id, takenAt) => (id === null ? null : instrument(id, takenAt ? dayOf(takenAt) : "")),
  };
}

/** The same answer to the same question, asked once. */
function once<Key extends string[], Value>(look: (...key: Key) => Promise<Value>): (...key: Key) => Promise<Value> {
  const known = new Map<string, Promise<Value>>();
  return (...key) => {
    const name = key.join(" ");
    const found = known.get(name) ?? look(...key);
    known.set(name, found);
    return found;
  };
}
