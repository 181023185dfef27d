import request from "supertest";
import { SCOPES, type Scope } from "@/api-spec/define";
import { makeKey } from "./accounts";

/** A partner application: it knows a key and speaks HTTP. */
export interface Partner {
  key: string;
  organisationId: string;
  send: (method: "get" | "post" | "patch" | "delete", path: string, body?: unknown, headers?: Record<string, string>) => request.Test;
}

export async function partner(settings: { organisationId?: string; environment?: "sandbox" | "production"; scopes?: Scope[] } = {}): Promise<Partner> {
  const { text: key, organisationId } = await makeKey({ scopes: Object.keys(SCOPES) as Scope[], ...settings });
  return {
    key,
    organisationId,
    send: (method, path, body, headers = {}) => {
      const sent = request(process.env.AVERDUCT_TEST_URL!)[method](`/api/v1${path}`).set("Authorization", `Bearer ${key}`).set(headers);
      return body === undefined ? sent : sent.send(body as object);
    },
  };
}

/** An invented traverse of a lined supply main, complete for issue but for its instrument. */
export const SUPPLY_MAIN = {
  system: "AHU-1",
  location: "Supply main, north riser",
  technician: "R. Okonjo-Lindqvist",
  takenAt: "2026-11-20T14:05:00Z",
  holes: { count: 5, sealed: true, method: "plugs" },
  duct: { shape: "rectangular", measured: "outside", width: { value: 26, unit: "in" }, height: { value: 18, unit: "in" }, wall: { lining: { value: 1, unit: "in" } } },
  layout: "log_tchebycheff",
  readings: {
    kind: "velocity_pressure", unit: "in_wg",
    lines: [[0.041, 0.052, 0.055, 0.05, 0.04], [0.05, 0.061, 0.064, 0.06, 0.048], [0.054, 0.063, 0.066, 0.062, 0.051], [0.052, 0.062, 0.064, 0.059, 0.049], [0.043, 0.053, 0.056, 0.051, 0.042]],
  },
  air: { dryBulb: { value: 58, unit: "degF" }, relativeHumidity: { value: 85, unit: "percent" }, altitude: { value: 1640, unit: "ft" } },
  design: { airflow: { value: 2600, unit: "ft3/min" } },
} as const;

/** A project and an instrument in calibration. */
export async function arrange({ send }: Partner): Promise<{ projectId: string; instrumentId: string }> {
  const project = await send("post", "/projects", { name: "Marram Point Library", number: "26-114", location: "1,640 ft" }).expect(201);
  const instrument = await send("post", "/instruments", { name: "Micromanometer 2", serialNumber: "TA-0412", principle: "differential_pressure" }).expect(201);
  await send("post", `/instruments/${instrument.body.id}/calibrations`, { calibratedOn: "2026-03-02", dueOn: "2027-03-02", laboratory: "Saltmarsh Metrology", certificateNumber: "SM-2213" }).expect(201);
  return { projectId: project.body.id, instrumentId: instrument.body.id };
}

/** An issued record, made through HTTP. */
export async function issuedRecord(by: Partner): Promise<string> {
  const references = await arrange(by);
  const { body } = await by.send("post", "/traverses", { ...SUPPLY_MAIN, ...references }).expect(201);
  await by.send("post", `/traverses/${body.id}/issue`).expect(200);
  return body.id as string;
}
