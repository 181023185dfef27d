import { describe, expect, it } from "vitest";
import { calculate, ROUND_TRAVERSE } from "../support/api";
import { makeKey, makeOrganisation } from "../support/accounts";

describe("limits of a plan", () => {
  it("answers 429 with Retry-After beyond the burst limit, and goes on in the next second", async () => {
    const { text } = await makeKey({ organisationId: await makeOrganisation({ requestsPerSecond: 5 }) });
    const answers = await Promise.all(Array.from({ length: 40 }, () => calculate("airflow", text, ROUND_TRAVERSE)));
    const passed = answers.filter(({ status }) => status === 200).length;
    const refused = answers.filter(({ status }) => status === 429);
    // The 40 requests may straddle the turn of a second, or two.
    expect(passed).toBeGreaterThanOrEqual(5);
    expect(passed).toBeLessThanOrEqual(15);
    expect(refused.length).toBe(40 - passed);
    expect(refused[0]!.body.type).toMatch(/burst-limit-reached$/);
    expect(Number(refused[0]!.headers["retry-after"])).toBe(1);
    await new Promise((resolve) => setTimeout(resolve, 1_100));
    await calculate("airflow", text, ROUND_TRAVERSE).expect(200);
  });

  it("answers 429 once the month's quota is used up", async () => {
    const { text } = await makeKey({ organisationId: await makeOrganisation({ monthlyRequests: 3 }) });
    for (let call = 0; call < 3; call += 1) await calculate("airflow", text, ROUND_TRAVERSE).expect(200);
    const { body, headers } = await calculate("airflow", text, ROUND_TRAVERSE).expect(429);
    expect(body.type).toMatch(/quota-reached$/);
    expect(headers.ratelimit).toContain('"month";r=0');
    expect(Number(headers["retry-after"])).toBeGreaterThan(0);
  });
});
