import { describe, expect, it } from "vitest";
import { airflow as definition } from "@/api-spec/calculations/airflow";
import { airflow } from "@/lib/airflow/calculations/airflow";
import { toSi } from "@/lib/airflow/units/convert";
import { relative } from "./values";
import traverses from "./traverses.json";

/** What is left is the order of the arithmetic: psychrolib has the same gas constant and saturation pressure. */
const TOLERANCE = 1e-12;

describe("whole traverses, calculated outside the project by tests/reference/traverses.py", () => {
  it.each(traverses.cases)("$title", ({ title: _title, expected, ...body }) => {
    const answer = airflow(definition.body!.parse(body));
    const { actual, standard, mass } = answer.airflow;
    expect(relative(toSi("density", answer.air.density), expected.density)).toBeLessThan(TOLERANCE);
    expect(relative(toSi("velocity", answer.averageVelocity), expected.averageVelocity)).toBeLessThan(TOLERANCE);
    expect(relative(toSi("airflow", actual), expected.actual)).toBeLessThan(TOLERANCE);
    expect(relative(toSi("airflow", standard), expected.standard)).toBeLessThan(TOLERANCE);
    expect(relative(toSi("massFlow", mass), expected.mass)).toBeLessThan(TOLERANCE);
  });
});
