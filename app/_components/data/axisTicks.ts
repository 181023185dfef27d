/** Steps that people count in, within a power of ten. */
const STEPS = [1, 2, 5, 10];
const WANTED = 4;

/** Round values from nothing to the first at or above the greatest: `axisTicks(37)` → 0, 10, 20, 30, 40. */
export function axisTicks(greatest: number): number[] {
  if (!(greatest > 0)) return [0, 1];
  const rough = greatest / WANTED;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = Math.max(1, power * (STEPS.find((candidate) => candidate * power >= rough) ?? 10));
  return Array.from({ length: Math.ceil(greatest / step) + 1 }, (_, index) => index * step);
}
