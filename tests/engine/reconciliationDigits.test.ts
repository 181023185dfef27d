import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { forEachDigitVariant, type DigitSlip } from "@/lib/airflow/reconciliation/digitVariants";

function variants(written: number, places = 0): Record<DigitSlip, number[]> {
  const found: Record<DigitSlip, number[]> = { digit_changed: [], digits_swapped: [], digit_dropped: [], digit_added: [], decimal_moved: [] };
  forEachDigitVariant(written, places, (slip, used) => found[slip].push(used));
  return found;
}

describe("what a slip makes of a written number", () => {
  it("follows from its digits", () => {
    const found = variants(1094);
    expect(found.digit_changed).toHaveLength(35);
    expect(found.digit_changed).toContain(1034);
    expect(found.digits_swapped).toEqual([1049, 1904]);
    expect(found.digit_dropped).toEqual([109, 104, 194, 94]);
    expect(found.digit_added).toEqual(expect.arrayContaining([11094, 10094, 10994, 10944, 10947]));
    expect(found.decimal_moved).toEqual([10940, 109.4, 109400, 10.94]);
  });

  it("keeps the decimal point where it is, and counts the zeros behind it", () => {
    const found = variants(0.09, 3);
    expect(found.digit_changed).toEqual(expect.arrayContaining([0.091, 0.19, 0.02]));
    expect(found.digits_swapped).toEqual([0.009, 0.9]);
    expect(found.digit_added).toEqual(expect.arrayContaining([0.0909, 0.099]));
    expect(variants(12.5, 1).digits_swapped).toEqual([15.2, 21.5]);
  });

  it("keeps the sign", () => expect(variants(-12).digits_swapped).toEqual([-21]));

  const written = fc.integer({ min: 10, max: 99_999 });
  it("never is the number itself, nor twice the same by the same slip", () => {
    fc.assert(fc.property(written, fc.integer({ min: 0, max: 4 }), (whole, places) => {
      const number = whole / 10 ** places;
      for (const made of Object.values(variants(number, places))) {
        expect(made).not.toContain(number);
        expect(new Set(made).size).toBe(made.length);
      }
    }), { seed: 2 });
  });

  it("is complete for whole numbers, against a comparison of the numerals themselves", () => {
    const isChanged = (one: string, other: string): boolean => one.length === other.length && [...one].filter((digit, place) => digit !== other[place]).length === 1;
    const isDropped = (long: string, short: string): boolean => [...long].some((_, place) => Number(long.slice(0, place) + long.slice(place + 1)) === Number(short));
    fc.assert(fc.property(fc.integer({ min: 10, max: 999 }), (number) => {
      const found = variants(number);
      for (let other = 1; other <= 9999; other += 1) {
        const [before, after] = [String(number), String(other)];
        if (isChanged(before, after) !== found.digit_changed.includes(other)) expect.fail(`changed: ${before} ${after}`);
        if (other !== number && isDropped(before, after) !== found.digit_dropped.includes(other)) expect.fail(`dropped: ${before} ${after}`);
        if (after.length === before.length + 1 && isDropped(after, before) !== found.digit_added.includes(other)) expect.fail(`added: ${before} ${after}`);
      }
    }), { seed: 3, numRuns: 20 });
  });
});
