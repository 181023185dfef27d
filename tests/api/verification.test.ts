import { spawnSync } from "node:child_process";
import { mkdtempSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { CompactSign, exportJWK, generateKeyPair, SignJWT } from "jose";
import { beforeAll, describe, expect, it } from "vitest";
import { testDatabase } from "../support/accounts";
import { api } from "../support/api";
import { issuedRecord, partner, type Partner } from "../support/records";

interface Signature {
  jws: string;
  document: string;
  keyId: string;
}

const verify = (body: object) => api().post("/api/v1/verify").send(body);

/** Runs what an attacker with the database would run: without the triggers that hold an issued record. */
async function behindTheTriggers(change: (db: ReturnType<typeof testDatabase>) => Promise<unknown>): Promise<void> {
  const db = testDatabase();
  const [[{ Statement, Timing, Event, Table, Trigger }]] = (await db.raw("SHOW TRIGGERS WHERE `Trigger` = 'traverses_issued_stay'")) as [[Record<string, string>]];
  const [[documents]] = (await db.raw("SHOW TRIGGERS WHERE `Trigger` = 'issued_documents_stay'")) as [[Record<string, string>]];
  await db.raw("DROP TRIGGER traverses_issued_stay");
  await db.raw("DROP TRIGGER issued_documents_stay");
  try {
    await change(db);
  } finally {
    await db.raw(`CREATE TRIGGER ${Trigger} ${Timing} ${Event} ON ${Table} FOR EACH ROW ${Statement}`);
    await db.raw(`CREATE TRIGGER ${documents!["Trigger"]} ${documents!["Timing"]} ${documents!["Event"]} ON ${documents!["Table"]} FOR EACH ROW ${documents!["Statement"]}`);
  }
}

describe("a signature", () => {
  let app: Partner;
  let id: string;
  let signature: Signature;
  let keys: { keys: Record<string, string>[] };
  beforeAll(async () => {
    app = await partner();
    id = await issuedRecord(app);
    signature = (await app.send("get", `/traverses/${id}/signature`).expect(200)).body;
    keys = (await api().get("/.well-known/jwks.json").expect(200)).body;
  });

  it("holds, and tells what has become of the record", async () => {
    const { body } = await verify({ jws: signature.jws, document: signature.document }).expect(200);
    expect(body).toMatchObject({ valid: true, reason: null, keyId: signature.keyId, record: { id, status: "issued", revision: 1 } });
    const payload = Buffer.from(signature.document).toString("base64url");
    expect((await verify({ jws: signature.jws.replace("..", `.${payload}.`) })).body).toMatchObject({ valid: true, record: { id } });
  });

  it("covers canonical JSON, and publishes nothing private", () => {
    const parsed = JSON.parse(signature.document) as Record<string, unknown>;
    expect(Object.keys(parsed)).toEqual(Object.keys(parsed).sort());
    expect(/\n|": /.test(signature.document)).toBe(false);
    for (const key of keys.keys) expect(Object.keys(key).sort()).toEqual(["alg", "crv", "kid", "kty", "use", "x"]);
  });

  it("does not hold when any byte of the document is another", async () => {
    for (let at = 0; at < signature.document.length; at += Math.ceil(signature.document.length / 12)) {
      const other = signature.document[at] === "1" ? "2" : "1";
      const document = signature.document.slice(0, at) + other + signature.document.slice(at + 1);
      expect((await verify({ jws: signature.jws, document })).body).toMatchObject({ valid: false, reason: "signature_does_not_match", record: null });
    }
  });

  it("of another key, another algorithm or none is not ours", async () => {
    const { privateKey, publicKey } = await generateKeyPair("EdDSA", { extractable: true });
    const detached = (jws: string): string => jws.split(".").map((part, index) => (index === 1 ? "" : part)).join(".");
    const payload = new TextEncoder().encode(signature.document);
    const forged = detached(await new CompactSign(payload).setProtectedHeader({ alg: "EdDSA", kid: signature.keyId }).sign(privateKey));
    expect((await verify({ jws: forged, document: signature.document })).body.reason).toBe("signature_does_not_match");
    const stranger = detached(await new CompactSign(payload).setProtectedHeader({ alg: "EdDSA", kid: "stranger", jwk: await exportJWK(publicKey) }).sign(privateKey));
    expect((await verify({ jws: stranger, document: signature.document })).body.reason).toBe("unknown_key");
    // The public key taken for a shared secret: the classical confusion of algorithms.
    const secret = new TextEncoder().encode(keys.keys.find(({ kid }) => kid === signature.keyId)!["x"]!.padEnd(64, "="));
    const confused = detached(await new CompactSign(payload).setProtectedHeader({ alg: "HS256", kid: signature.keyId }).sign(secret));
    expect((await verify({ jws: confused, document: signature.document })).body.valid).toBe(false);
    const none = `${Buffer.from(JSON.stringify({ alg: "none", kid: signature.keyId })).toString("base64url")}..`;
    expect((await verify({ jws: none, document: signature.document })).body.valid).toBe(false);
    const token = await new SignJWT({}).setProtectedHeader({ alg: "HS256" }).sign(secret);
    for (const jws of [token, "nonsense", "..", "a.b"]) expect((await verify({ jws, document: signature.document })).body).toMatchObject({ valid: false, reason: "not_a_jws" });
  });

  it("is checked by the examples, in TypeScript and in Python, without the API", () => {
    const folder = mkdtempSync(path.join(tmpdir(), "averduct-verify-"));
    const place = (name: string, content: unknown): string => {
      const file = path.join(folder, name);
      writeFileSync(file, JSON.stringify(content));
      return file;
    };
    const jwks = place("jwks.json", keys);
    const whole = place("whole.json", signature);
    const altered = place("altered.json", { ...signature, document: signature.document.replace('"revision":1', '"revision":2') });
    for (const [program, ...script] of [[process.execPath, "--import", "tsx", "examples/verify/verify.ts"], ["python3", "examples/verify/verify.py"]] as const) {
      const run = (file: string) => spawnSync(program, [...script, file, jwks], { encoding: "utf8" });
      expect(run(whole)).toMatchObject({ status: 0, stdout: expect.stringContaining("The signature holds.") });
      expect(run(altered)).toMatchObject({ status: 1, stdout: expect.stringContaining("DOES NOT HOLD") });
    }
  });

  it("says that the record was altered in the database, whichever way", async () => {
    const state = async () => (await app.send("get", `/traverses/${id}/signature`)).body as Signature;
    const page = async () => (await api().get(`/verify/${id}`)).text;
    expect(await page()).toContain("The record is as it was signed");
    await behindTheTriggers(async (db) => {
      const { result } = await db("traverses").where({ id }).first("result");
      const altered = { ...result, airflow: { ...result.airflow, actual: { ...result.airflow.actual, value: result.airflow.actual.value + 100 } } };
      await db("traverses").where({ id }).update({ result: JSON.stringify(altered) });
      expect(await page()).toContain("This record was altered");
      await db("traverses").where({ id }).update({ result: JSON.stringify(result) });
      expect(await page()).toContain("The record is as it was signed");
      const { document } = await state();
      await db("issued_documents").where({ traverse_id: id }).update({ document: document.replace('"revision":1', '"revision":2') });
      expect(await page()).toContain("This record was altered");
      await db("issued_documents").where({ traverse_id: id }).update({ document });
    });
  });

  it("goes on holding after the signing key is replaced", async () => {
    await testDatabase()("signing_keys").whereNull("retired_at").update({ retired_at: new Date() });
    const later = await issuedRecord(app);
    const second = (await app.send("get", `/traverses/${later}/signature`)).body as Signature;
    expect(second.keyId).not.toBe(signature.keyId);
    for (const one of [signature, second]) expect((await verify({ jws: one.jws, document: one.document })).body.valid).toBe(true);
  });
});
