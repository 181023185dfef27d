import type { Browser, BrowserContext, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { calculate } from "../support/api";
import { makeKey, testDatabase } from "../support/accounts";
import { at, openBrowser } from "../support/browser";
import { openAccount } from "../support/portal";
import { until } from "../support/receiver";
import { partner } from "../support/records";

/** Two diameters of six by log-linear, as a spreadsheet puts them on the clipboard. */
const BLOCK = [[812, 798], [934, 926], [1010, 1013], [1004, 1009], [921, 930], [806, 811]].map((row) => row.join("\t")).join("\r\n");

describe("the Bench", () => {
  let browser: Browser;
  let context: BrowserContext;
  let page: Page;
  let email: string;
  beforeAll(async () => {
    browser = await openBrowser();
    const account = await openAccount();
    email = account.email;
    const [name, value] = account.cookie.split("=") as [string, string];
    context = await browser.newContext();
    await context.addCookies([{ name, value, url: process.env.AVERDUCT_TEST_URL! }]);
    page = await context.newPage();
    await page.goto(at("/bench"));
  });
  afterAll(() => browser.close());

  const paste = (label: string, text: string): Promise<void> =>
    page.getByLabel(label, { exact: true }).evaluate((cell, clip) => {
      const data = new DataTransfer();
      data.setData("text/plain", clip);
      cell.dispatchEvent(new ClipboardEvent("paste", { clipboardData: data, bubbles: true, cancelable: true }));
    }, text);
  /** What is chosen before the page has come alive is lost, so it is chosen until the sheet says so. */
  const readVelocity = (): Promise<boolean> =>
    until("a sheet in ft/min", async () => {
      await page.getByLabel("Read as").selectOption("velocity_pressure");
      await page.getByLabel("Read as").selectOption("velocity");
      return page.getByText("Readings, ft/min A blank left empty").isVisible();
    });
  const airflowShown = async (): Promise<string> => (await page.locator("section[aria-label=Result] p.text-figure").textContent())!.replace(/\s.*/, "");

  it("draws the plan before anything was read", async () => {
    await page.getByRole("img", { name: /Traverse plan/ }).waitFor();
    expect(await page.getByLabel(/^Hole 2, point \d+$/).count()).toBeGreaterThan(5);
  });

  it("takes a block from a spreadsheet, and gives what the API gives", async () => {
    await readVelocity();
    await paste("Hole 1, point 1", BLOCK);
    await page.getByRole("region", { name: "Result" }).waitFor();
    const { text } = await makeKey();
    const lines = [0, 1].map((column) => BLOCK.split("\r\n").map((row) => Number(row.split("\t")[column])));
    const { body } = await calculate("airflow", text, { duct: { shape: "round", measured: "inside", diameter: { value: 14, unit: "in" } }, readings: { kind: "velocity", unit: "ft/min", lines } });
    expect(await airflowShown()).toBe(Math.round(body.airflow.actual.value).toLocaleString("en-GB"));
  });

  it("moves with Enter and the arrows, and rings a reading that looks like a slip while it is typed", async () => {
    await page.getByLabel("Hole 1, point 2", { exact: true }).focus();
    await page.keyboard.press("Enter");
    expect(await page.evaluate(() => document.activeElement?.getAttribute("aria-label"))).toBe("Hole 1, point 3");
    await page.keyboard.press("ArrowRight");
    expect(await page.evaluate(() => document.activeElement?.getAttribute("aria-label"))).toBe("Hole 2, point 3");
    await page.keyboard.type("9013");
    await page.getByText(/Ringed: a reading that looks like a slip/).waitFor();
    await page.getByLabel("Hole 2, point 3", { exact: true }).fill("1013");
  });

  it("says what cannot be, in the engine's words", async () => {
    await page.getByLabel("Measured", { exact: true }).selectOption("outside");
    await page.getByLabel("Lining").fill("9");
    await page.getByText("This cannot be").waitFor();
    await page.getByLabel("Lining").fill("x");
    await page.getByText("Write a number").waitFor();
    await page.getByLabel("Lining").fill("");
    await page.getByLabel("Measured", { exact: true }).selectOption("inside");
    await page.getByRole("region", { name: "Result" }).waitFor();
  });

  it("is shared by a link that holds it all, and nothing is sent", async () => {
    const before = await airflowShown();
    const sent: string[] = [];
    const other = await context.newPage();
    other.on("request", (request) => request.method() !== "GET" && sent.push(request.url()));
    await other.goto(page.url());
    await other.getByRole("region", { name: "Result" }).waitFor();
    expect((await other.locator("section[aria-label=Result] p.text-figure").textContent())!.replace(/\s.*/, "")).toBe(before);
    expect(sent).toEqual([]);
    await other.close();
    await page.goto(at("/bench#nonsense"));
    await page.getByRole("img", { name: /Traverse plan/ }).waitFor();
  });

  it("keeps it as a record", async () => {
    const { organisation_id } = await testDatabase()("memberships as m").join("users as u", "u.id", "m.user_id").where("u.email", email).first("m.organisation_id");
    await (await partner({ organisationId: organisation_id })).send("post", "/projects", { name: "Marram Point Library" }).expect(201);
    await page.goto(at("/bench"));
    await readVelocity();
    await paste("Hole 1, point 1", BLOCK);
    await page.getByLabel("System").fill("EF-3");
    await page.getByRole("button", { name: "Keep as a record" }).click();
    await page.getByRole("link", { name: "To the record" }).waitFor();
  });
});
