import { beforeAll, describe, expect, it } from "vitest";
import { traversePlan } from "@/api-spec/calculations/traversePlan";
import { calculate, ROUND_TRAVERSE } from "../support/api";
import { makeKey } from "../support/accounts";

/** One reading with two digits swapped: 1 400 written where about 1 040 belongs. */
const SLIPPED = { ...ROUND_TRAVERSE, readings: { ...ROUND_TRAVERSE.readings, lines: [[812, 934, 1010, 4010, 921, 806], ROUND_TRAVERSE.readings.lines[1]!] } };

describe("a drawing instead of figures", () => {
  let key: string;
  beforeAll(async () => {
    ({ text: key } = await makeKey());
  });
  const draw = (operation: string, body: unknown, accept = "image/svg+xml") => calculate(operation, key, body).set("Accept", accept).buffer(true);

  it.each(traversePlan.examples!.map(({ name, body }) => [name, body] as const))("plans can be drawn: %s", async (_, body) => {
    const answer = await draw("traverse-plan", body).expect(200);
    expect(answer.headers["content-type"]).toBe("image/svg+xml; charset=utf-8");
    expect(answer.headers["vary"]).toBe("Accept");
    const svg = answer.body.toString();
    const points = (await calculate("traverse-plan", key, body).expect(200)).body.points as number;
    expect(svg).toContain(`${points} points`);
    expect(svg).toMatch(/^<svg [^>]*role="img"[\s\S]*<title>.+<\/title><desc>.+<\/desc>/);
  });

  it("shows the readings of an airflow where they were taken, and rings the one that looks like a slip", async () => {
    const whole = (await draw("airflow", ROUND_TRAVERSE).expect(200)).body.toString();
    for (const reading of ROUND_TRAVERSE.readings.lines.flat()) expect(whole).toContain(`>${reading}</text>`);
    expect(whole).not.toContain("Ringed");
    expect((await draw("airflow", SLIPPED).expect(200)).body.toString()).toContain("Ringed: a reading that looks like a slip.");
  });

  it("is JSON for whoever asks for that first, or for nothing in particular", async () => {
    for (const accept of ["application/json, image/svg+xml", "*/*"]) expect((await calculate("airflow", key, ROUND_TRAVERSE).set("Accept", accept)).body).toHaveProperty("airflow");
  });

  it("is a problem for what the figures would be a problem for", async () => {
    const { body } = await calculate("airflow", key, { ...ROUND_TRAVERSE, air: { dryBulb: { value: -400, unit: "degF" } } }).set("Accept", "image/svg+xml").expect(422);
    expect(body.errors[0].pointer).toBe("/air/dryBulb");
  });
});
