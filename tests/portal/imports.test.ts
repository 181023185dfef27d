import { readFileSync } from "node:fs";
import path from "node:path";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { testDatabase } from "../support/accounts";
import { accessibilityFindings, at, openBrowser, overflow } from "../support/browser";
import { openAccount } from "../support/portal";
import { partner } from "../support/records";

const TEMPLATE = readFileSync(path.join(import.meta.dirname, "../../examples/csv/row-per-traverse.csv"));

describe("imports in the portal", () => {
  let browser: Browser;
  let page: Page;
  beforeAll(async () => {
    browser = await openBrowser();
    const { email, cookie } = await openAccount();
    const { organisation_id } = await testDatabase()("memberships as m").join("users as u", "u.id", "m.user_id").where("u.email", email).first("m.organisation_id");
    await (await partner({ organisationId: organisation_id })).send("post", "/projects", { name: "Marram Point Library" }).expect(201);
    const context = await browser.newContext();
    const [name, value] = cookie.split("=") as [string, string];
    await context.addCookies([{ name, value, url: process.env.AVERDUCT_TEST_URL! }]);
    page = await context.newPage();
    await page.goto(at("/imports"));
  });
  afterAll(() => browser.close());

  const choose = (name: string, content: Buffer | string): Promise<void> => page.getByLabel("CSV file").setInputFiles({ name, mimeType: "text/csv", buffer: Buffer.from(content) });

  it("name every fault by row and column, and make nothing", async () => {
    await choose("faulty.csv", TEMPLATE.toString("utf8").replace("rectangular", "triangular"));
    await page.getByLabel("Project").selectOption({ label: "Marram Point Library" });
    await page.getByRole("button", { name: "Check the file" }).click();
    await page.getByText("Nothing was made. Mend the file").waitFor();
    expect(await page.getByRole("table", { name: "Faults, by row" }).textContent()).toContain("duct_shape");
    expect(await page.getByRole("button", { name: /^Make/ }).count()).toBe(0);
  });

  it("make the drafts of a file that has none, once", async () => {
    await choose("readings.csv", TEMPLATE);
    await page.getByRole("button", { name: "Check the file" }).click();
    await page.getByText("Nothing at fault").waitFor();
    await page.getByRole("button", { name: "Make 3 drafts" }).click();
    await page.getByText("3 drafts made").waitFor();
    await page.getByRole("table", { name: "Imported before, the latest first" }).getByText("readings.csv").waitFor();
    await page.getByRole("link", { name: "T1" }).click();
    await page.getByRole("heading", { name: /AHU-1/ }).waitFor();
  });

  it("are taken as pasted rows too, and what was imported stays to be looked at", async () => {
    await page.goto(at("/imports"));
    const rows = TEMPLATE.toString("utf8").split("\r\n").slice(0, 2).join("\n").replace('"Supply main, north riser"', "Supply main").replace('"Outside air damper at minimum, supply fan at 52 Hz."', "").replaceAll(",", "\t");
    await page.getByLabel("Or rows from a spreadsheet").fill(rows);
    await page.getByLabel("Project").selectOption({ label: "Marram Point Library" });
    await page.getByRole("button", { name: "Check the file" }).click();
    await page.getByRole("button", { name: "Make 1 draft" }).click();
    await page.getByText("1 draft made").waitFor();
    await page.getByRole("link", { name: "Pasted rows" }).click();
    await page.getByRole("heading", { name: "Pasted rows" }).waitFor();
    expect(await page.getByRole("link", { name: "T1" }).getAttribute("href")).toMatch(/^\/records\/trv_/);
    expect(await accessibilityFindings(page)).toEqual([]);
    await page.goto(at("/imports/imp_01kbc000000000000000000000"));
    await page.getByText("Page not found").first().waitFor();
  });

  it("offer the templates as the examples have them", async () => {
    await page.goto(at("/imports"));
    const [download] = await Promise.all([page.waitForEvent("download"), page.getByRole("link", { name: "one row a traverse" }).click()]);
    expect(readFileSync(await download.path())).toEqual(TEMPLATE);
  });

  it("axe finds nothing, nothing sticks out", async () => {
    await page.goto(at("/imports"));
    await choose("readings.csv", TEMPLATE);
    await page.getByLabel("Project").selectOption({ label: "Marram Point Library" });
    await page.getByRole("button", { name: "Check the file" }).click();
    await page.getByText("Nothing at fault").waitFor();
    for (const [colorScheme, width] of [["light", 1280], ["light", 360], ["dark", 360], ["dark", 1280]] as const) {
      await page.emulateMedia({ colorScheme });
      await page.setViewportSize({ width, height: 800 });
      expect(await accessibilityFindings(page), `${colorScheme} ${width}`).toEqual([]);
      expect(await overflow(page), `${width}`).toBe(0);
    }
  });
});
