import { createHash, randomUUID } from "node:crypto";
import { mkdtempSync, rmSync, utimesSync } from "node:fs";
import { request as httpRequest } from "node:http";
import { tmpdir } from "node:os";
import path from "node:path";
import { Readable } from "node:stream";
import { crc32 } from "node:zlib";
import request from "supertest";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { LARGEST_FILE, MOST_ATTACHMENTS } from "@/api-spec/records/attachments";
import { database } from "@/db/connection";
import { newId } from "@/lib/ids/newId";
import { deleteAttachmentsOf } from "@/lib/records/attachments/change";
import { linkTo } from "@/lib/records/attachments/link";
import { deleteObjectsAfterCommit, storageKey, sweepObjects } from "@/lib/records/attachments/objects";
import { config } from "@/lib/runtime/config";
import { NoSuchObject, objectStore, openObjectStore } from "@/lib/storage/objectStore";
import { testDatabase } from "../support/accounts";
import { openBrowser } from "../support/browser";
import { arrange, issuedRecord, partner, type Partner } from "../support/records";

/** Files as Debian's Chromium makes them, which shares no code with what looks at them here. */
const files = {} as Record<"image/jpeg" | "image/png" | "application/pdf", Buffer>;
let app: Partner;
let projectId: string;

beforeAll(async () => {
  const browser = await openBrowser();
  try {
    const page = await browser.newPage({ viewport: { width: 640, height: 400 } });
    await page.setContent('<body style="background:linear-gradient(#2a6,#a26)"><h1>Supply main, north riser</h1>');
    files["image/jpeg"] = await page.screenshot({ type: "jpeg" });
    files["image/png"] = await page.screenshot({ type: "png" });
    files["application/pdf"] = await page.pdf();
  } finally {
    await browser.close();
  }
  app = await partner();
  ({ projectId } = await arrange(app));
});

const draft = async (): Promise<string> => (await app.send("post", "/traverses", { projectId }).expect(201)).body.id as string;

function upload(traverse: string, file: Buffer, { name = "photo.jpg", type = "image/jpeg", caption = "", key = app.key, headers = {} }: { name?: string; type?: string; caption?: string; key?: string; headers?: Record<string, string> } = {}): request.Test {
  const sent = request(process.env.AVERDUCT_TEST_URL!).post(`/api/v1/traverses/${traverse}/attachments`).set("Authorization", `Bearer ${key}`).set(headers);
  return sent.field("caption", caption).attach("file", file, { filename: name, contentType: type });
}

/** The content behind a link, asked for without a key. */
const follow = (url: string): request.Test => request(url).get("").buffer(true).parse((response, done) => {
  const chunks: Buffer[] = [];
  response.on("data", (chunk: Buffer) => chunks.push(chunk)).on("end", () => done(null, Buffer.concat(chunks)));
});

const isStored = (key: string): Promise<boolean> => objectStore().get(key).then(async ({ body }) => (await body.cancel(), true), (error: unknown) => {
  if (error instanceof NoSuchObject) return false;
  throw error;
});
const keyOf = (id: string): string => storageKey({ organisationId: app.organisationId, environment: "sandbox" }, id);
const storedKeys = async (): Promise<string[]> => {
  const keys = [];
  for await (const { key } of objectStore().list()) if (key.startsWith(app.organisationId)) keys.push(key);
  return keys;
};

/** A PNG of exactly so many bytes: a private chunk of zeros goes before its end. */
function pngOf(bytes: number): Buffer {
  const [body, end] = [files["image/png"].subarray(0, -12), files["image/png"].subarray(-12)];
  const chunk = Buffer.alloc(bytes - body.length - end.length);
  chunk.writeUInt32BE(chunk.length - 12, 0);
  chunk.write("prVt", 4, "latin1");
  chunk.writeUInt32BE(crc32(chunk.subarray(4, -4)), chunk.length - 4);
  return Buffer.concat([body, chunk, end]);
}

describe("an attachment", () => {
  it.each(["image/jpeg", "image/png", "application/pdf"] as const)("is told to be %s from its content, and given back as it was", async (type) => {
    const { body, headers } = await upload(await draft(), files[type], { name: "notes.html", type: "text/html", caption: "Hole 3, before plugging" }).expect(201);
    expect(body).toMatchObject({ mediaType: type, fileName: "notes.html", caption: "Hole 3, before plugging", bytes: files[type].length, sha256: createHash("sha256").update(files[type]).digest("hex") });
    expect(headers["location"]).toBe(`/api/v1/traverses/${body.traverseId}/attachments/${body.id}`);
    expect(Date.parse(body.urlExpiresAt) - Date.now()).toBeGreaterThan(290_000);
    expect(Date.parse(body.urlExpiresAt) - Date.now()).toBeLessThanOrEqual(300_000);
    const content = await follow(body.url).expect(200);
    expect((content.body as Buffer).equals(files[type])).toBe(true);
    expect(content.headers).toMatchObject({
      "content-type": type, "cache-control": "private, max-age=300", "x-content-type-options": "nosniff",
      "content-disposition": "inline; filename*=UTF-8''notes.html", "content-security-policy": "sandbox; default-src 'none'", "referrer-policy": "no-referrer",
    });
  });

  it.each([
    ["../../etc/passwd", "passwd"],
    ["C:\\photos\\main.jpg", "main.jpg"],
    ["Zuluft Nord – Öffnung 測定.jpg", "Zuluft Nord – Öffnung 測定.jpg"],
    ["a\u202Egpj.exe", "agpj.exe"],
    ["..", "attachment.jpg"],
    [`${"x".repeat(300)}.jpg`, "x".repeat(200)],
  ])("named %j is shown as %j", async (name, shown) => {
    const { body } = await upload(await draft(), files["image/jpeg"], { name }).expect(201);
    expect(body.fileName).toBe(shown);
    const { headers } = await follow(body.url).expect(200);
    expect(decodeURIComponent(headers["content-disposition"]!.split("UTF-8''")[1]!)).toBe(shown);
  });

  it("is listed, read, captioned and deleted, with its history, and its bytes go with it", async () => {
    const traverse = await draft();
    const { body } = await upload(traverse, files["image/png"]).expect(201);
    const second = await upload(traverse, files["application/pdf"]).expect(201);
    const address = `/traverses/${traverse}/attachments/${body.id}`;
    expect(body.caption).toBeNull();
    expect((await app.send("get", `/traverses/${traverse}/attachments`).expect(200)).body.items.map(({ id }: { id: string }) => id)).toEqual([body.id, second.body.id]);
    await app.send("patch", address, { caption: "North riser" }).expect(200);
    await app.send("patch", address, { caption: "x".repeat(501) }).expect(422);
    expect((await app.send("get", address).expect(200)).body).toMatchObject({ caption: "North riser", sha256: body.sha256 });
    expect(await isStored(keyOf(body.id))).toBe(true);
    await app.send("delete", address).expect(204);
    await app.send("get", address).expect(404);
    await expect.poll(() => isStored(keyOf(body.id))).toBe(false);
    await follow(body.url).expect(404);
    expect(await isStored(keyOf(second.body.id))).toBe(true);
    const history = (await app.send("get", `/traverses/${traverse}/history`)).body.items as { action: string }[];
    expect(history.map(({ action }) => action)).toEqual(["created", "attachment_added", "attachment_added", "attachment_changed", "attachment_deleted"]);
  });

  it("sent five times at once with one Idempotency-Key is made once, and its bytes are kept once", async () => {
    const traverse = await draft();
    const before = await storedKeys();
    const headers = { "Idempotency-Key": randomUUID() };
    const answers = await Promise.all(Array.from({ length: 5 }, () => upload(traverse, files["image/png"], { headers }).expect(201)));
    expect(new Set(answers.map(({ text }) => text)).size).toBe(1);
    expect((await app.send("get", `/traverses/${traverse}/attachments`)).body.items).toHaveLength(1);
    await expect.poll(async () => (await storedKeys()).length).toBe(before.length + 1);
    expect((await upload(traverse, files["image/jpeg"], { headers }).expect(422)).body.type).toContain("idempotency-key-reused");
  });

  it(`is one of ${MOST_ATTACHMENTS} at most, also where two are sent at once`, async () => {
    const traverse = await draft();
    const { body } = await upload(traverse, files["image/png"]).expect(201);
    const row = await testDatabase()("attachments").where("id", body.id).first();
    await testDatabase()("attachments").insert(Array.from({ length: MOST_ATTACHMENTS - 2 }, () => ({ ...row, id: newId("att") })));
    const two = await Promise.all([upload(traverse, files["image/jpeg"]), upload(traverse, files["image/jpeg"])]);
    expect(two.map(({ status }) => status).sort()).toEqual([201, 422]);
    expect(two.find(({ status }) => status === 422)!.body.errors[0].code).toBe("too_many_attachments");
  });
});

describe("a file that is not taken", () => {
  const html = Buffer.from("<!doctype html><script>alert(1)</script>");
  let traverse: string;
  beforeAll(async () => {
    traverse = await draft();
  });

  it.each<[string, () => Buffer, number, string]>([
    ["text that is named a JPEG", () => Buffer.from("no picture"), 415, "file_type_not_taken"],
    ["a page", () => html, 415, "file_type_not_taken"],
    ["an SVG drawing", () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'), 415, "file_type_not_taken"],
    ["nothing", () => Buffer.alloc(0), 415, "file_type_not_taken"],
    ["a PNG's beginning before a page", () => Buffer.concat([files["image/png"].subarray(0, 8), html]), 422, "file_damaged"],
    ["a JPEG's beginning before a page", () => Buffer.concat([Buffer.from([0xff, 0xd8, 0xff]), html]), 422, "file_damaged"],
    ["a PDF's beginning before a page", () => Buffer.concat([Buffer.from("%PDF-1.7\n"), html]), 422, "file_damaged"],
    ["a PNG with a page after it", () => Buffer.concat([files["image/png"], html]), 422, "data_after_end"],
    ["a JPEG with a page after it", () => Buffer.concat([files["image/jpeg"], html]), 422, "data_after_end"],
    ["a PDF with a page after it", () => Buffer.concat([files["application/pdf"], html]), 422, "file_damaged"],
    ["half a PNG", () => files["image/png"].subarray(0, files["image/png"].length / 2), 422, "file_damaged"],
    ["half a JPEG", () => files["image/jpeg"].subarray(0, files["image/jpeg"].length / 2), 422, "file_damaged"],
    ["half a PDF", () => files["application/pdf"].subarray(0, files["application/pdf"].length / 2), 422, "file_damaged"],
  ])("%s", async (_, make, status, code) => {
    const { body } = await upload(traverse, make()).expect(status);
    expect(body.errors).toMatchObject([{ pointer: "/file", code }]);
  });

  it("is larger than it may be, by one byte; one of just that size is taken", async () => {
    const taken = await upload(traverse, pngOf(LARGEST_FILE)).expect(201);
    expect(taken.body.bytes).toBe(LARGEST_FILE);
    const { body } = await upload(traverse, pngOf(LARGEST_FILE + 1)).expect(413);
    expect(body.errors).toMatchObject([{ pointer: "/file", code: "file_too_large" }]);
  });

  it.each([[true, 12], [false, 12], [true, 24], [false, 24]])("is in a form far too large, its length declared: %s, %i MiB", async (declared, mib) => {
    const answer = await postForm(traverse, "multipart/form-data; boundary=x", [`--x\r\nContent-Disposition: form-data; name="file"; filename="a.png"\r\n\r\n`, ...Array.from({ length: mib }, () => Buffer.alloc(1024 ** 2)), "\r\n--x--\r\n"], declared);
    expect(answer).toMatchObject({ status: 413, body: { errors: [{ code: "body_too_large" }] } });
  });

  it("is in a form without end, which is cut off", async () => {
    const outcome = await postForm(traverse, "multipart/form-data; boundary=x", Array.from({ length: 200 }, () => Buffer.alloc(1024 ** 2)), false).catch((error: NodeJS.ErrnoException) => ({ status: error.code }));
    expect([413, "ECONNRESET", "EPIPE"]).toContain(outcome.status);
    await app.send("get", `/traverses/${traverse}`).expect(200);
  });

  const part = (name: string, text: string, file = false): string => `--x\r\nContent-Disposition: form-data; name="${name}"${file ? '; filename="a.png"' : ""}\r\n\r\n${text}\r\n`;
  it.each<[string, string, string, number, string, string]>([
    ["JSON", "application/json", "{}", 415, "", "unsupported_media_type"],
    ["a form without a boundary", "multipart/form-data", `${part("file", "x", true)}--x--\r\n`, 422, "", "form_malformed"],
    ["a form of another boundary", "multipart/form-data; boundary=y", `${part("file", "x", true)}--x--\r\n`, 422, "", "form_malformed"],
    ["a form that is cut off", "multipart/form-data; boundary=x", part("file", "x", true), 422, "", "form_malformed"],
    ["an empty body", "multipart/form-data; boundary=x", "", 422, "", "form_malformed"],
    ["no form at all", "multipart/form-data; boundary=x", "file=x", 422, "", "form_malformed"],
    ["a form without a file", "multipart/form-data; boundary=x", `${part("caption", "x")}--x--\r\n`, 422, "", "missing_field"],
    ["two files", "multipart/form-data; boundary=x", `${part("file", "x", true)}${part("file", "y", true)}--x--\r\n`, 422, "/file", "repeated"],
    ["a file under another name", "multipart/form-data; boundary=x", `${part("photo", "x", true)}--x--\r\n`, 422, "/photo", "unrecognized_field"],
    ["two captions", "multipart/form-data; boundary=x", `${part("caption", "x")}${part("caption", "y")}${part("file", "x", true)}--x--\r\n`, 422, "/caption", "repeated"],
    ["thirty parts", "multipart/form-data; boundary=x", `${Array.from({ length: 30 }, (_, index) => part(`a${index}`, "x")).join("")}--x--\r\n`, 422, "", "too_many_parts"],
  ])("is in %s", async (_, type, text, status, pointer, code) => {
    const answer = await postForm(traverse, type, [text], true);
    expect(answer).toMatchObject({ status, body: { errors: expect.arrayContaining([expect.objectContaining({ pointer, code })]) } });
  });

  it.each([["an unknown field", "colour", "red", "/colour", "unrecognized_field"], ["a caption too long", "caption", "x".repeat(501), "/caption", "too_large"], ["a caption of 20 KiB", "caption", "x".repeat(20_480), "/caption", "too_large"]])("comes with %s", async (_, field, value, pointer, code) => {
    const answer = await request(process.env.AVERDUCT_TEST_URL!).post(`/api/v1/traverses/${traverse}/attachments`).set("Authorization", `Bearer ${app.key}`).field(field, value).attach("file", files["image/png"], "a.png").expect(422);
    expect(answer.body.errors).toMatchObject([{ pointer, code }]);
  });

  it("leaves nothing behind", async () => {
    const { items } = (await app.send("get", `/traverses/${traverse}/attachments`)).body as { items: { id: string }[] };
    expect(items).toHaveLength(1);
    const rows = await testDatabase()("attachments").where("organisation_id", app.organisationId).select("storage_key");
    const keys = new Set(rows.map(({ storage_key }) => storage_key as string));
    await expect.poll(async () => (await storedKeys()).filter((key) => !keys.has(key))).toEqual([]);
  });
});

describe("who may do what", () => {
  it("another organisation's key and the other environment's find nothing", async () => {
    const traverse = await draft();
    const { body } = await upload(traverse, files["image/png"]).expect(201);
    for (const other of [await partner(), await partner({ organisationId: app.organisationId, environment: "production" })]) {
      await upload(traverse, files["image/png"], { key: other.key }).expect(404);
      await other.send("get", `/traverses/${traverse}/attachments`).expect(404);
      for (const method of ["get", "patch", "delete"] as const) await other.send(method, `/traverses/${traverse}/attachments/${body.id}`, method === "patch" ? { caption: "x" } : undefined).expect(404);
      const own = (await other.send("post", "/traverses", { projectId: (await arrange(other)).projectId }).expect(201)).body.id as string;
      await other.send("get", `/traverses/${own}/attachments/${body.id}`).expect(404);
    }
    const { body: elsewhere } = await app.send("get", `/traverses/${await draft()}/attachments/${body.id}`).expect(404);
    expect(elsewhere.type).toContain("not-found");
  });

  it("a key that may only read attaches nothing", async () => {
    const reader = await partner({ organisationId: app.organisationId, scopes: ["records:read"] });
    const traverse = await draft();
    await upload(traverse, files["image/png"], { key: reader.key }).expect(403);
    await reader.send("get", `/traverses/${traverse}/attachments`).expect(200);
  });

  it("what was issued keeps its attachments as they were", async () => {
    const record = await issuedRecord(app);
    const { body } = await upload(await draft(), files["image/jpeg"]).expect(201);
    await testDatabase()("attachments").where("id", body.id).update({ traverse_id: record });
    const address = `/traverses/${record}/attachments/${body.id}`;
    for (const refused of [await upload(record, files["image/png"]), await app.send("patch", address, { caption: "x" }), await app.send("delete", address)]) {
      expect(refused.status).toBe(409);
      expect(refused.body.type).toContain("not-a-draft");
    }
    const read = await app.send("get", address).expect(200);
    expect(((await follow(read.body.url).expect(200)).body as Buffer).equals(files["image/jpeg"])).toBe(true);
  });

  it("a link is for one attachment, as it was made, until its end", async () => {
    const traverse = await draft();
    const [one, other] = [(await upload(traverse, files["image/png"]).expect(201)).body, (await upload(traverse, files["image/png"]).expect(201)).body];
    const changed = (change: (url: URL) => void): string => {
      const url = new URL(one.url as string);
      change(url);
      return url.href;
    };
    const signature = new URL(one.url as string).searchParams.get("signature")!;
    const forged = [
      ...Array.from(signature, (character, at) => changed(({ searchParams }) => searchParams.set("signature", signature.slice(0, at) + (character === "A" ? "B" : "A") + signature.slice(at + 1)))),
      changed(({ searchParams }) => searchParams.set("signature", `${signature}=`)),
      changed(({ searchParams }) => searchParams.set("signature", "")),
      changed(({ searchParams }) => searchParams.set("expires", String(Number(searchParams.get("expires")) + 1))),
      changed((url) => (url.pathname = url.pathname.replace(one.id as string, other.id as string))),
    ];
    for (const url of forged) expect((await follow(url)).status, url).toBe(410);
    // As the application made it at another time: it and the tests have the same local secret.
    const madeAgo = (seconds: number): string => {
      const { pathname, search } = new URL(linkTo(one.id as string, Date.now() - seconds * 1_000).url);
      return `${process.env.AVERDUCT_TEST_URL}${pathname}${search}`;
    };
    await follow(madeAgo(290)).expect(200);
    const late = await follow(madeAgo(301)).expect(410);
    expect(JSON.parse(String(late.body))).toMatchObject({ type: expect.stringContaining("link-not-valid"), errors: [{ parameter: "expires" }] });
    await follow(changed(({ searchParams }) => searchParams.delete("signature"))).expect(422);
    const head = await request(one.url as string).head("").expect(200);
    expect(head.headers["content-type"]).toBe("image/png");
  });
});

describe("bytes that nobody needs any more", () => {
  const realm = () => ({ organisationId: app.organisationId, environment: "sandbox" as const });

  it("go with their draft", async () => {
    const traverse = await draft();
    const ids = [(await upload(traverse, files["image/png"]).expect(201)).body.id, (await upload(traverse, files["application/pdf"]).expect(201)).body.id] as string[];
    for (const id of ids) expect(await isStored(keyOf(id))).toBe(true);
    await app.send("delete", `/traverses/${traverse}`).expect(204);
    for (const id of ids) await expect.poll(() => isStored(keyOf(id))).toBe(false);
    expect(await testDatabase()("attachments").where("traverse_id", traverse)).toEqual([]);
  });

  it("go with the rows of a traverse once that is committed, and stay where it is undone", async () => {
    const traverse = await draft();
    const ids = [(await upload(traverse, files["image/png"]).expect(201)).body.id, (await upload(traverse, files["image/jpeg"]).expect(201)).body.id] as string[];
    const remove = (undo: boolean) => database().transaction(async (db) => {
      deleteObjectsAfterCommit(db, await deleteAttachmentsOf(db, realm(), traverse));
      expect(await isStored(keyOf(ids[0]!))).toBe(true);
      if (undo) throw new Error("undone");
    });
    await expect(remove(true)).rejects.toThrow("undone");
    expect((await app.send("get", `/traverses/${traverse}/attachments`)).body.items).toHaveLength(2);
    for (const id of ids) expect(await isStored(keyOf(id))).toBe(true);
    await remove(false);
    for (const id of ids) await expect.poll(() => isStored(keyOf(id))).toBe(false);
  });

  it("are swept up a day after, and no others", async () => {
    const folder = mkdtempSync(path.join(tmpdir(), "objects-"));
    afterAll(() => rmSync(folder, { recursive: true, force: true }));
    const store = openObjectStore({ ...config(), S3_BUCKET: undefined, OBJECTS_FOLDER: folder });
    const { body } = await upload(await draft(), files["image/png"]).expect(201);
    const [held, orphan, young] = [keyOf(body.id), keyOf(newId("att")), keyOf(newId("att"))];
    const elsewhere = storageKey({ organisationId: newId("org"), environment: "sandbox" }, newId("att"));
    for (const key of [held, orphan, young, elsewhere, "something/else"]) await store.put(key, Buffer.from("x"), "image/png");
    const now = Date.now();
    for (const key of [held, orphan, elsewhere, "something/else"]) utimesSync(path.join(folder, key), now / 1_000, now / 1_000 - 90_000);
    expect(await sweepObjects(now, store)).toEqual([orphan]);
    await expect(store.get(orphan)).rejects.toBeInstanceOf(NoSuchObject);
  });
});

/** Posts a body of pieces as it is, with or without a word of its length. */
function postForm(traverse: string, type: string, pieces: (string | Buffer)[], declared: boolean): Promise<{ status: number | undefined; body: unknown }> {
  const buffers = pieces.map((piece) => Buffer.from(piece));
  return new Promise((resolve, reject) => {
    const headers = { Authorization: `Bearer ${app.key}`, "Content-Type": type, ...(declared && { "Content-Length": buffers.reduce((sum, { length }) => sum + length, 0) }) };
    const sending = httpRequest(`${process.env.AVERDUCT_TEST_URL}/api/v1/traverses/${traverse}/attachments`, { method: "POST", headers }, (response) => {
      const chunks: Buffer[] = [];
      response.on("data", (chunk: Buffer) => chunks.push(chunk)).on("end", () => resolve({ status: response.statusCode, body: JSON.parse(Buffer.concat(chunks).toString()) })).on("error", reject);
    }).on("error", reject);
    Readable.from(buffers).pipe(sending);
  });
}
