import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { calculate, ROUND_TRAVERSE } from "../support/api";
import { at, openBrowser } from "../support/browser";
import { freshEmail, PASSWORD } from "../support/portal";

describe("from nothing to usage that appears", () => {
  let browser: Browser;
  let page: Page;
  let key: string;
  const email = freshEmail();
  beforeAll(async () => {
    browser = await openBrowser();
    page = await browser.newPage();
  });
  afterAll(() => browser.close());

  it("says beside the fields what is wrong with a sign-up", async () => {
    await page.goto(at("/sign-up"));
    await page.getByLabel("Your name").fill("Bram Achterlund");
    await page.getByLabel("Organisation").fill("Slateboard Software");
    await page.getByLabel("E-mail").fill("nobody");
    await page.getByLabel("Password").fill("a few unrelated words");
    await page.getByRole("button", { name: "Create the account" }).click();
    await page.getByText("The account was not created").waitFor();
    expect(await page.getByLabel("E-mail").getAttribute("aria-invalid")).toBe("true");
    expect(await page.getByLabel("Your name").inputValue()).toBe("Bram Achterlund");
  });

  it("signs up, and the e-mail is in the local mailbox", async () => {
    await page.getByLabel("E-mail").fill(email);
    await page.getByLabel("Password").fill(PASSWORD);
    await page.getByRole("button", { name: "Create the account" }).click();
    await page.getByText("An e-mail is on its way").waitFor();
    await page.getByRole("link", { name: "local mailbox" }).click();
    await page.getByText(`To ${email}`).waitFor();
  });

  it("confirms the address from the e-mail and comes in", async () => {
    await page.locator("section", { hasText: `To ${email}` }).getByRole("link").click();
    await page.getByRole("button", { name: "Confirm" }).click();
    await page.waitForURL("**/overview");
    await page.getByText("No key yet").waitFor();
  });

  it("makes a key with the keyboard alone", async () => {
    await page.goto(at("/keys/new"));
    await page.getByLabel("Name").focus();
    await page.keyboard.type("Field app");
    await page.keyboard.press("Enter");
    const secret = page.getByText(/^averduct_sandbox_[0-9a-z]{26}_[0-9A-Za-z]{38}$/);
    await secret.waitFor();
    key = (await secret.textContent())!;
    expect(await page.getByRole("region", { name: /Request/ }).textContent()).toContain(key);
  });

  it("does not show the key again", async () => {
    await page.goto(at("/keys"));
    await page.getByRole("link", { name: "Field app" }).waitFor();
    expect(await page.content()).not.toContain(key);
  });

  it("shows the usage of the first calls, in the chart's table", async () => {
    for (let call = 0; call < 3; call += 1) await calculate("airflow", key, ROUND_TRAVERSE).expect(200);
    await calculate("airflow", key, {}).expect(422);
    await page.waitForTimeout(1_000);
    await page.goto(at("/usage"));
    await page.getByRole("button", { name: "Show the table" }).first().click();
    const today = new Date().toISOString().slice(0, 10);
    const row = page.getByRole("table", { name: "Requests by day" }).getByRole("row", { name: new RegExp(today) });
    expect(await row.getByRole("cell").allTextContents()).toEqual(["3", "1", "4"]);
    expect(await page.getByRole("table", { name: "Operations" }).getByRole("row", { name: /airflow/ }).getByRole("cell").first().textContent()).toBe("4");
  });

  it("revokes the key after saying what depends on it", async () => {
    await page.goto(at("/keys"));
    await page.getByRole("link", { name: "Field app" }).click();
    await page.getByRole("button", { name: "Revoke the key" }).click();
    const dialog = page.getByRole("alertdialog");
    expect(await dialog.textContent()).toMatch(/last used at .* UTC from .*, for airflow/);
    await dialog.getByRole("button", { name: "Revoke the key" }).click();
    await page.getByText("Revoked").first().waitFor();
    await page.waitForTimeout(3_000);
    await calculate("airflow", key, ROUND_TRAVERSE).expect(401);
  });

  it("signs out, and the portal asks to sign in again", async () => {
    await page.getByRole("button", { name: "Sign out" }).click();
    await page.waitForURL(at("/"));
    await page.goto(at("/usage"));
    await page.waitForURL("**/sign-in?next=%2Fusage");
    await page.getByLabel("E-mail").fill(email);
    await page.getByLabel("Password").fill(PASSWORD);
    await page.keyboard.press("Enter");
    await page.waitForURL("**/usage");
  });

  it("does not follow a link that leads away after signing in", async () => {
    await page.getByRole("button", { name: "Sign out" }).click();
    await page.waitForURL(at("/"));
    await page.goto(at("/sign-in?next=//elsewhere.example"));
    await page.getByLabel("E-mail").fill(email);
    await page.getByLabel("Password").fill(PASSWORD);
    await page.keyboard.press("Enter");
    await page.waitForURL(at("/overview"));
  });
});

describe("the public pages", () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it("calculate on the first page, through the real API", async () => {
    const page = await browser.newPage();
    await page.goto(at("/"));
    await page.getByText(/200 in \d+ ms/).waitFor();
    expect(await page.getByText(/± \d+ \(k = 2\)/).count()).toBe(1);
  });

  it("try an operation from the reference with a sandbox key", async () => {
    const { openAccount } = await import("../support/portal");
    const { cookie } = await openAccount();
    const [name, value] = cookie.split("=") as [string, string];
    const context = await browser.newContext();
    await context.addCookies([{ name, value, url: process.env.AVERDUCT_TEST_URL! }]);
    const page = await context.newPage();
    await page.goto(at("/docs/reference"));
    await page.getByRole("button", { name: "Use a sandbox key" }).click();
    await page.getByText("is in place").waitFor();
    await page.locator("#operations-Calculations-airflow .opblock-summary-control").click();
    await page.getByRole("button", { name: "Try it out" }).click();
    await page.getByRole("button", { name: "Execute" }).click();
    await page.locator(".live-responses-table tr.response td.response-col_status", { hasText: "200" }).waitFor();
  });

  it("have a page for every kind of problem", async () => {
    const { PROBLEMS } = await import("@/api-spec/problems");
    for (const [slug, { title }] of Object.entries(PROBLEMS)) {
      const answer = await fetch(at(`/docs/problems/${slug}`));
      expect(answer.status).toBe(200);
      expect(await answer.text()).toContain(title.replaceAll("'", "&#x27;"));
    }
    expect((await fetch(at("/docs/problems/no-such"))).status).toBe(404);
  });
});
