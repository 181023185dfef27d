import axe from "axe-core";
import { chromium, type Browser, type Page } from "playwright-core";

const ARGUMENTS = [
  "--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync",
];

/** Debian's Chromium, headless. */
export const openBrowser = (): Promise<Browser> => chromium.launch({ executablePath: "/usr/bin/chromium", args: ARGUMENTS });

export const at = (path: string): string => `${process.env.AVERDUCT_TEST_URL}${path}`;

/** What axe-core finds on the page as it stands, in words. */
export async function accessibilityFindings(page: Page): Promise<string[]> {
  // Run in the page's own world, where the content security policy does not apply to what the test brings.
  await page.evaluate(axe.source);
  const { violations } = await page.evaluate(() => (window as unknown as { axe: typeof axe }).axe.run());
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(" ")).join(", ")}`);
}

/** How far the page is wider than its window, in pixels. */
export const overflow = (page: Page): Promise<number> => page.evaluate(() => Math.max(0, document.documentElement.scrollWidth - window.innerWidth));
