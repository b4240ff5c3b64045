import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { accessProblems, openBrowser, signedIn } from "./portal";

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

it("keeps a field return as it is typed, and says what is missing before it is sent", async () => {
  const { page, faults } = await signedIn(browser, "requester@harrowbay.example");
  await page.goto("/cases/new");
  await page.getByRole("button", { name: "Start the field return" }).click();
  await page.getByRole("heading", { name: "New field return" }).waitFor();
  const address = page.url();
  const name = page.getByRole("textbox", { name: "Part", exact: true });
  const saved = page.waitForResponse((answer) => answer.request().method() === "PUT");
  await name.fill("Winch pawl");
  expect((await saved).status()).toBe(200);
  await page.getByRole("button", { name: "Send to the laboratory" }).click();
  await page.getByRole("complementary", { name: "Help" }).getByRole("link").first().waitFor();
  expect(page.url()).toBe(address);
  expect(await accessProblems(page)).toEqual([]);
  await page.reload();
  expect(await page.getByRole("textbox", { name: "Part", exact: true }).inputValue()).toBe(
    "Winch pawl",
  );
  expect(faults).toEqual([]);
});
