import AxeBuilder from "@axe-core/playwright";
import { type Browser, chromium, type Page } from "playwright-core";

/** Password of every account of the demonstration. */
export const DEMO_PASSWORD = "Riverline-demo-1";

const baseUrl = (): string => {
  const url = process.env.TEST_BASE_URL;
  if (!url) throw new Error("TEST_BASE_URL is not set; run the journeys by the test command");
  return url;
};

export function openBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: process.env.CHROMIUM ?? "/usr/bin/chromium",
    args: ["--no-sandbox", "--disable-dev-shm-usage", "--disable-gpu"],
  });
}

type Look = { width?: number; height?: number; theme?: "light" | "dark" };

type Window = { page: Page; faults: string[] };

/** A window of its own; `faults` gathers what the page complains of. */
export async function signedOut(
  browser: Browser,
  { width = 1440, height = 900, theme = "light" }: Look = {},
  baseURL = baseUrl(),
): Promise<Window> {
  const context = await browser.newContext({
    baseURL,
    viewport: { width, height },
    colorScheme: theme,
  });
  const page = await context.newPage();
  const faults: string[] = [];
  page.on("pageerror", (error) => faults.push(`${page.url()}: ${error.message}`));
  page.on("console", (message) => {
    if (message.type() === "error") faults.push(`${page.url()}: ${message.text()}`);
  });
  return { page, faults };
}

/** A window of its own, signed in. */
export async function signedIn(
  browser: Browser,
  email: string,
  look?: Look,
  baseURL?: string,
): Promise<Window> {
  const { page, faults } = await signedOut(browser, look, baseURL);
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((url) => !url.pathname.startsWith("/sign-in"));
  return { page, faults };
}

/** Address of a case, found as a person finds it: by its number, in the search field. */
export async function caseAddress(page: Page, number: string): Promise<string> {
  await page.goto(`/cases?q=${encodeURIComponent(number)}`);
  const href = await page
    .getByRole("row")
    .filter({ hasText: number })
    .getByRole("link")
    .first()
    .getAttribute("href");
  if (!href) throw new Error(`${number} is not in the list`);
  return href;
}

/** Rules of WCAG 2.2 A and AA the page breaks, each with the first place. */
export async function accessProblems(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page })
    .withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"])
    .analyze();
  return violations.map(
    (found) =>
      `${new URL(page.url()).pathname} ${found.id} (${found.nodes.length}): ${found.nodes[0]?.html.slice(0, 160) ?? ""} ${found.nodes[0]?.failureSummary?.slice(0, 200) ?? ""}`,
  );
}

/** Whether the page is wider than its window. */
export function isTooWide(page: Page): Promise<boolean> {
  return page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth);
}
