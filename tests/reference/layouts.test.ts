import { describe, expect, it } from "vitest";
import { LOG_LINEAR } from "@/lib/airflow/layout/logLinear";
import { LOG_TCHEBYCHEFF } from "@/lib/airflow/layout/logTchebycheff";
import { derivedLogLinear, derivedLogTchebycheff } from "./derivations";
import { reference } from "./values";

const points = reference["4_traverse_points"];
const rounded = (positions: readonly number[]): number[] => positions.map((position) => Math.round(position * 1000) / 1000);

describe("log-Tchebycheff positions in a rectangle", () => {
  const { printed, printed_status, derived, iso_from_axis, iso_status } = points.log_tchebycheff_rect;

  it.each(Object.entries(printed))(`%s points on a side are as printed (${printed_status})`, (count, positions) => {
    expect(LOG_TCHEBYCHEFF[Number(count)]).toEqual(positions);
  });

  it.each([5, 6, 7])("%i points on a side: every decimal follows from the rule, derived here", (count) => {
    expect(LOG_TCHEBYCHEFF[count]).toEqual(rounded(derivedLogTchebycheff(count)));
  });

  it.each([5, 6, 7] as const)("%i points on a side: the derivation agrees with one made outside the project", (count) => {
    for (const [index, position] of derivedLogTchebycheff(count).entries()) expect(position).toBeCloseTo(Number(derived[count][index]), 9);
  });

  it.each([5, 6, 7] as const)(`%i points on a side: distances from the axis are those of ISO 3966 (${iso_status})`, (count) => {
    const fromAxis = LOG_TCHEBYCHEFF[count]!.filter((position) => position >= 0.5).map((position) => position - 0.5);
    for (const [index, distance] of fromAxis.entries()) expect(distance).toBeCloseTo(iso_from_axis[count][index]!, 12);
  });
});

describe("log-linear positions on a diameter", () => {
  const { printed_y_over_D, status, derived_half, iso3966_rR_memory } = points.log_linear_circular;

  it.each(Object.entries(printed_y_over_D).map(([count, positions]) => ({ count, positions, status: status[count as keyof typeof status] })))(
    "$count points are as printed ($status)",
    ({ count, positions }) => expect(LOG_LINEAR[Number(count)]).toEqual(positions),
  );

  it.each([4, 6, 8, 10])("%i points: every decimal follows from the rule, derived here", (count) => {
    expect(LOG_LINEAR[count]).toEqual(rounded(derivedLogLinear(count)));
  });

  it.each([4, 6, 8, 10] as const)("%i points: the derivation agrees with one made outside the project", (count) => {
    for (const [index, published] of derived_half[count].entries()) expect(derivedLogLinear(count)[index]).toBeCloseTo(Number(published), 9);
  });

  it.each([3, 5] as const)("%i points on a radius lie within the tolerances that ISO 3966 prints (memory)", (perRadius) => {
    const radii = LOG_LINEAR[2 * perRadius]!.slice(perRadius).map((position) => 2 * position - 1);
    for (const [index, text] of iso3966_rR_memory[perRadius].entries()) {
      const [value, tolerance] = text.split("+-").map(Number) as [number, number];
      expect(Math.abs(radii[index]! - value)).toBeLessThanOrEqual(tolerance);
    }
  });
});
