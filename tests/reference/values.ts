import reference from "./reference-values.json";

/** Published values, each with its source and whether it was read there, computed, or is from memory. */
export { reference };

interface Published {
  name: string;
  value: unknown;
  status: string;
  source?: string | string[];
}

/** The title of a source, for the name of a test. */
export function titleOf(source: string | string[] | undefined): string {
  const sources = reference.sources as Record<string, { title: string }>;
  return [source ?? []].flat().map((key) => sources[key]?.title ?? key).join("; ");
}

/** Where a published value comes from and how surely, for the name of a test. */
export const cited = ({ status, source }: Omit<Published, "name" | "value">): string => `(${status}${source ? `: ${titleOf(source)}` : ""})`;

/** The published value of a name, with its citation. A name that is not there is an error in the test. */
export function published<Value>(values: readonly Published[], name: string): { value: Value; citation: string } {
  const found = values.find((one) => one.name === name);
  if (!found) throw new Error(`No published value is named "${name}".`);
  return { value: found.value as Value, citation: cited(found) };
}

/** Relative difference of a computed value from a published one. */
export const relative = (computed: number, value: number): number => Math.abs(computed / value - 1);
