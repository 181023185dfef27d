import type { Browser, BrowserContext, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { testDatabase } from "../support/accounts";
import { accessibilityFindings, at, openBrowser, overflow } from "../support/browser";
import { openAccount } from "../support/portal";
import { arrange, issuedRecord, partner, SUPPLY_MAIN, type Partner } from "../support/records";

describe("records in the portal", () => {
  let browser: Browser;
  let context: BrowserContext;
  let app: Partner;
  let draft: string;
  let incomplete: string;
  let issued: string;
  let references: { projectId: string; instrumentId: string };
  beforeAll(async () => {
    browser = await openBrowser();
    const { email, cookie } = await openAccount();
    const { organisation_id } = await testDatabase()("memberships as m").join("users as u", "u.id", "m.user_id").where("u.email", email).first("m.organisation_id");
    app = await partner({ organisationId: organisation_id });
    references = await arrange(app);
    draft = (await app.send("post", "/traverses", { ...SUPPLY_MAIN, ...references, system: "AHU-7" }).expect(201)).body.id;
    incomplete = (await app.send("post", "/traverses", { projectId: references.projectId, duct: SUPPLY_MAIN.duct }).expect(201)).body.id;
    issued = await issuedRecord(app);
    context = await browser.newContext();
    const [name, value] = cookie.split("=") as [string, string];
    await context.addCookies([{ name, value, url: process.env.AVERDUCT_TEST_URL! }]);
  });
  afterAll(() => browser.close());

  const pages = (): string[] => [
    "/records", "/records?view=drawings", "/records?status=void", `/records/${draft}`, `/records/${incomplete}`, `/records/${issued}`,
    "/projects", "/projects/new", `/projects/${references.projectId}`, "/instruments", "/instruments/new", `/instruments/${references.instrumentId}`,
  ];
  it.each(Array.from({ length: 12 }, (_, index) => index))("axe finds nothing, nothing sticks out: page %i", async (index) => {
    const path = pages()[index]!;
    const page = await context.newPage();
    await page.goto(at(path));
    await page.getByRole("main").waitFor();
    for (const [colorScheme, width] of [["light", 1280], ["light", 360], ["dark", 360], ["dark", 1280]] as const) {
      await page.emulateMedia({ colorScheme });
      await page.setViewportSize({ width, height: 800 });
      expect(await accessibilityFindings(page), `${path} ${colorScheme} ${width}`).toEqual([]);
      expect(await overflow(page), `${path} ${width}`).toBe(0);
    }
    await page.close();
  });

  describe("with the keyboard alone", () => {
    let page: Page;
    beforeAll(async () => {
      page = await context.newPage();
      await page.goto(at("/records"));
    });

    it("narrows the list to a draft, and opens it", async () => {
      await page.getByLabel("System").focus();
      await page.keyboard.type("AHU-7");
      await page.keyboard.press("Enter");
      await page.waitForURL("**/records?*system=AHU-7*");
      expect(await page.getByRole("row").count()).toBe(2);
      await page.getByRole("link", { name: "AHU-7" }).press("Enter");
      await page.getByRole("heading", { name: /AHU-7/ }).waitFor();
    });

    it("issues it, and everyone can see it", async () => {
      await page.getByRole("button", { name: "Issue", exact: true }).press("Enter");
      await page.getByRole("button", { name: "Issue the traverse" }).press("Enter");
      await page.getByRole("link", { name: "Public page" }).waitFor();
      expect(await (await fetch(at(`/verify/${draft}`))).text()).toContain("The record is as it was signed");
      const certificate = await page.request.get(at(`/api/portal/records/${draft}/certificate.pdf`));
      expect((await certificate.body()).subarray(0, 5).toString()).toBe("%PDF-");
    });

    it("does not void it without a reason, and does with one", async () => {
      await page.getByRole("button", { name: "Void the record" }).press("Enter");
      await page.getByText("The record was not voided").waitFor();
      await page.getByLabel("Reason to void it").fill("The fire damper was shut.");
      await page.keyboard.press("Enter");
      await page.getByText("The fire damper was shut.").first().waitFor();
      expect((await app.send("get", `/traverses/${draft}`)).body.status).toBe("void");
    });
  });

  it("say what a draft still needs, and do not issue it", async () => {
    const page = await context.newPage();
    await page.goto(at(`/records/${incomplete}`));
    await page.getByText("Who took the traverse is not said.").waitFor();
    expect(await page.getByRole("button", { name: "Issue", exact: true }).isDisabled()).toBe(true);
    await page.close();
  });

  it("are of the environment that is chosen, and of no other", async () => {
    const page = await context.newPage();
    await page.goto(at("/records"));
    await page.getByLabel("Records of").selectOption("production");
    await page.getByText("No traverse is like this").waitFor();
    await page.goto(at(`/records/${issued}`));
    await page.getByText("Page not found").first().waitFor();
    await page.goto(at("/records"));
    await page.getByLabel("Records of").selectOption("sandbox");
    await page.getByRole("table", { name: "Traverses" }).waitFor();
    await page.close();
  });

  it("make a project and an instrument with its calibration", async () => {
    const page = await context.newPage();
    await page.goto(at("/projects/new"));
    await page.getByRole("button", { name: "Make the project" }).click();
    await page.getByText("The project was not made").waitFor();
    await page.getByLabel("Name").fill("Dunlin Quay Clinic");
    await page.getByRole("button", { name: "Make the project" }).click();
    await page.getByRole("heading", { name: "Dunlin Quay Clinic" }).waitFor();
    await page.goto(at("/instruments/new"));
    await page.getByLabel("Name").fill("Vane 4 in");
    await page.getByLabel("Principle").selectOption("rotating_vane");
    await page.getByRole("button", { name: "Add the instrument" }).click();
    await page.getByText("Not calibrated").waitFor();
    await page.getByLabel("Calibrated on").fill("2026-05-01");
    await page.getByLabel("Due on").fill("2036-05-01");
    await page.getByRole("button", { name: "Add the calibration" }).click();
    await page.getByText("Until 2036-05-01").waitFor();
    await page.close();
  });
});
