import { describe, it } from "vitest";
import { api } from "../support/api";

describe("health", () => {
  it("says that the process answers", () => api().get("/api/healthz").expect(200, { status: "ok" }));
  it("says that the database does too", () => api().get("/api/readyz").expect(200, { status: "ready", database: true }));
});
