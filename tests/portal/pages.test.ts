import type { Browser, BrowserContext } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { testDatabase } from "../support/accounts";
import { accessibilityFindings, at, openBrowser, overflow } from "../support/browser";
import { openAccount, portal, sessionOf, PASSWORD } from "../support/portal";

const PUBLIC = ["/", "/sign-in", "/sign-up", "/forgot-password", "/reset-password", "/verify-email", "/mailbox", "/docs", "/docs/units", "/docs/problems", "/docs/problems/invalid-request", "/docs/cautions", "/docs/changelog", "/nowhere"];
const MEMBER = ["/overview", "/bench", "/keys", "/keys/new", "/usage"];
const ADMINISTRATOR = ["/admin", "/admin/usage"];

describe("every page, in both themes, wide and narrow", () => {
  let browser: Browser;
  let member: string;
  let administrator: string;
  beforeAll(async () => {
    browser = await openBrowser();
    member = (await openAccount()).cookie;
    await portal("keys", { name: "Field app", environment: "sandbox", scopes: ["calculations"] }, member).expect(201);
    const { email } = await openAccount();
    await testDatabase()("users").where({ email }).update({ is_administrator: true });
    administrator = sessionOf(await portal("auth/sign-in", { email, password: PASSWORD }).expect(200))!;
  });
  afterAll(() => browser.close());

  const contextFor = async (path: string): Promise<BrowserContext> => {
    const context = await browser.newContext();
    const cookie = MEMBER.includes(path) ? member : ADMINISTRATOR.includes(path) ? administrator : null;
    if (cookie) {
      const [name, value] = cookie.split("=") as [string, string];
      await context.addCookies([{ name, value, url: process.env.AVERDUCT_TEST_URL! }]);
    }
    return context;
  };

  it.each([...PUBLIC, ...MEMBER, ...ADMINISTRATOR])("%s: axe finds nothing, nothing sticks out, no console errors", async (path) => {
    const context = await contextFor(path);
    const page = await context.newPage();
    const errors: string[] = [];
    page.on("console", (message) => message.type() === "error" && errors.push(message.text()));
    page.on("pageerror", (error) => errors.push(error.message));
    await page.goto(at(path));
    await page.getByRole("main").waitFor();
    for (const [colorScheme, width] of [["light", 1280], ["light", 360], ["dark", 360], ["dark", 1280]] as const) {
      await page.emulateMedia({ colorScheme });
      await page.setViewportSize({ width, height: 800 });
      const place = `${path} ${colorScheme} ${width}`;
      expect(await accessibilityFindings(page), place).toEqual([]);
      expect(await overflow(page), place).toBe(0);
    }
    expect(errors.filter((text) => !text.includes("404"))).toEqual([]);
    await context.close();
  });

  it("is served under a policy that allows no inline script, the reference apart", async () => {
    const policy = async (path: string): Promise<string> => (await fetch(at(path))).headers.get("content-security-policy") ?? "";
    expect(await policy("/")).toMatch(/script-src 'self' 'nonce-[^']+' 'strict-dynamic';/);
    expect(await policy("/docs/reference")).toContain("script-src 'self' 'unsafe-inline'");
  });
});
