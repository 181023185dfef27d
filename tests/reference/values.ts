import reference from "./reference-values.json";

/** Published values, each with its source and whether it was read there, computed, or is from memory. */
export { reference };

/** The title of a source, for the name of a test. */
export function titleOf(source: string | string[] | undefined): string {
  const sources = reference.sources as Record<string, { title: string }>;
  return [source ?? []].flat().map((key) => sources[key]?.title ?? key).join("; ");
}

/** Relative difference of a computed value from a published one. */
export const relative = (computed: number, published: number): number => Math.abs(computed / published - 1);
