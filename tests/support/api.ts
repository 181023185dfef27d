import request from "supertest";

/** Speaks HTTP to the running application. */
export const api = (): ReturnType<typeof request> => request(process.env.AVERDUCT_TEST_URL!);

/** Posts to a calculation with a key. */
export const calculate = (operation: string, key: string, body: unknown): request.Test =>
  api().post(`/api/v1/calculations/${operation}`).set("Authorization", `Bearer ${key}`).send(body as object);

export const ROUND_TRAVERSE = {
  duct: { shape: "round", measured: "inside", diameter: { value: 14, unit: "in" } },
  readings: { kind: "velocity", unit: "ft/min", lines: [[812, 934, 1010, 1004, 921, 806], [798, 926, 1013, 1009, 930, 811]] },
};
