import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { accessProblems, caseAddress, isTooWide, openBrowser, signedIn } from "./portal";

const STATIONS = [
  "",
  "/field-return",
  "/evidence",
  "/images",
  "/hardness",
  "/strength",
  "/weighing",
  "/findings",
  "/sign-off",
  "/report",
  "/history",
];

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

describe.each([
  { width: 1440, height: 900, theme: "light" as const },
  { width: 1024, height: 768, theme: "dark" as const },
])("every station at $width x $height, $theme", (look) => {
  it("opens without a fault, fits its window and keeps the rules of access", async () => {
    const { page, faults } = await signedIn(browser, "lead@calderstreet.example", look);
    const address = await caseAddress(page, "RL-2026-0142");
    const problems: string[] = [];
    for (const path of ["/cases", "/reference", ...STATIONS.map((one) => address + one)]) {
      await page.goto(path);
      await page.waitForLoadState("networkidle");
      if (await isTooWide(page)) problems.push(`${path} is wider than its window`);
      problems.push(...(await accessProblems(page)));
    }
    expect([...problems, ...faults]).toEqual([]);
    await page.context().close();
  });

  it("shows the picture with its marks on the bench", async () => {
    const { page, faults } = await signedIn(browser, "investigator@calderstreet.example", look);
    const address = await caseAddress(page, "RL-2026-0142");
    await page.goto(`${address}/images`);
    await page.getByRole("link", { name: /^IM-03/ }).click();
    await page.getByRole("toolbar", { name: "Tools" }).waitFor();
    await expect(page.getByText("Crack depth").first().isVisible()).resolves.toBe(true);
    await page.waitForLoadState("networkidle");
    expect([...(await accessProblems(page)), ...faults]).toEqual([]);
    await page.context().close();
  });
});
