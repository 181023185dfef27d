import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { accessibilityFindings, at, openBrowser, overflow } from "../support/browser";
import { issuedRecord, partner } from "../support/records";

describe("a record as anyone sees it", () => {
  let browser: Browser;
  const records: { path: string; shows: string }[] = [];
  beforeAll(async () => {
    browser = await openBrowser();
    const app = await partner({ environment: "production" });
    const [stands, replaced, withdrawn] = [await issuedRecord(app), await issuedRecord(app), await issuedRecord(app)];
    const { body } = await app.send("post", `/traverses/${replaced}/revisions`).expect(201);
    await app.send("post", `/traverses/${body.id}/issue`).expect(200);
    await app.send("post", `/traverses/${withdrawn}/void`, { reason: "The fire damper was shut." }).expect(200);
    records.push({ path: `/verify/${stands}`, shows: "2,531" }, { path: `/verify/${replaced}`, shows: body.id as string }, { path: `/verify/${withdrawn}`, shows: "The fire damper was shut." });
  });
  afterAll(() => browser.close());

  it.each([0, 1, 2])("axe finds nothing, nothing sticks out, and it says how it stands: %i", async (index) => {
    const { path, shows } = records[index]!;
    const page = await browser.newPage();
    await page.goto(at(path));
    await page.getByText("The record is as it was signed").waitFor();
    expect(await page.getByRole("main").textContent()).toContain(shows);
    for (const [colorScheme, width] of [["light", 1280], ["light", 360], ["dark", 360], ["dark", 1280]] as const) {
      await page.emulateMedia({ colorScheme });
      await page.setViewportSize({ width, height: 800 });
      expect(await accessibilityFindings(page), `${path} ${colorScheme} ${width}`).toEqual([]);
      expect(await overflow(page), `${path} ${width}`).toBe(0);
    }
    await page.close();
  });

  it("is not found where nothing was issued", async () => {
    for (const path of ["/verify/trv_01kbc000000000000000000000", "/verify/anything"]) expect((await fetch(at(path))).status).toBe(404);
  });
});
