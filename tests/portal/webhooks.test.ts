import type { Browser, BrowserContext } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { accessibilityFindings, at, openBrowser, overflow } from "../support/browser";
import { openAccount } from "../support/portal";

describe("webhooks in the portal", () => {
  let browser: Browser;
  let context: BrowserContext;
  beforeAll(async () => {
    browser = await openBrowser();
    const [name, value] = (await openAccount()).cookie.split("=") as [string, string];
    context = await browser.newContext();
    await context.addCookies([{ name, value, url: process.env.AVERDUCT_TEST_URL! }]);
  });
  afterAll(() => browser.close());

  it("are made, turned off and deleted, with the keyboard alone", async () => {
    const page = await context.newPage();
    await page.goto(at("/webhooks/new"));
    await page.getByLabel("Address").focus();
    await page.keyboard.type("not an address");
    await page.keyboard.press("Enter");
    await page.getByText("The endpoint was not made").waitFor();
    await page.getByLabel("Address").fill("http://127.0.0.1:9/told");
    await page.keyboard.press("Enter");
    const secret = page.getByText(/^whsec_[A-Za-z0-9+/=]+$/);
    await secret.waitFor();
    await page.getByRole("link", { name: "To the endpoint" }).press("Enter");
    await page.getByRole("button", { name: "Turn off" }).press("Enter");
    await page.getByRole("button", { name: "Turn on" }).waitFor();
    await page.getByRole("button", { name: "Delete" }).press("Enter");
    await page.getByRole("button", { name: "Delete the endpoint" }).press("Enter");
    await page.getByText("No endpoints yet").waitFor();
    await page.close();
  });

  it.each(["/webhooks", "/webhooks/new"])("%s: axe finds nothing, nothing sticks out", async (path) => {
    const page = await context.newPage();
    await page.goto(at(path));
    for (const [colorScheme, width] of [["light", 1280], ["dark", 360]] as const) {
      await page.emulateMedia({ colorScheme });
      await page.setViewportSize({ width, height: 800 });
      expect(await accessibilityFindings(page), `${path} ${colorScheme} ${width}`).toEqual([]);
      expect(await overflow(page), `${path} ${width}`).toBe(0);
    }
    await page.close();
  });
});
