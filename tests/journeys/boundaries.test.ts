import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { caseAddress, openBrowser, signedIn } from "./portal";

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

it("shows another client's requester nothing of a case, on no address of it", async () => {
  const own = await signedIn(browser, "requester@harrowbay.example");
  const address = await caseAddress(own.page, "RL-2026-0134");
  const other = await signedIn(browser, "requester@tesselwind.example");
  for (const path of ["", "/field-return", "/findings", "/report", "/images"]) {
    await other.page.goto(address + path);
    expect(await other.page.getByRole("heading", { level: 1 }).textContent()).toBe(
      "This is not here, or it is not yours to see",
    );
    expect(await other.page.content()).not.toContain("Boom pin");
  }
  const api = `/api${address}/report/1.pdf`;
  expect((await other.page.request.get(api)).status()).toBe(404);
  const mine = await own.page.request.get(api);
  expect(mine.headers()["content-type"]).toBe("application/pdf");
  expect((await mine.body()).subarray(0, 5).toString()).toBe("%PDF-");
});

it("asks a person who is signed out to sign in, and comes back to the page after", async () => {
  const { page } = await signedIn(browser, "lead@calderstreet.example");
  const address = await caseAddress(page, "RL-2026-0142");
  await page.context().clearCookies();
  await page.goto(`${address}/evidence`);
  await page.getByRole("button", { name: "Sign in" }).waitFor();
  await page.getByLabel("E-mail").fill("lead@calderstreet.example");
  await page.getByLabel("Password", { exact: true }).fill("Riverline-demo-1");
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((url) => url.pathname === `${address}/evidence`);
});
