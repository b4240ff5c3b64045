import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { caseAddress, DEMO_PASSWORD, openBrowser, signedIn } from "./portal";

const NUMBER = "RL-2026-0127";

let browser: Browser;
let folder: string;
beforeAll(async () => {
  browser = await openBrowser();
  folder = mkdtempSync(path.join(tmpdir(), "riverline-journey-"));
});
afterAll(async () => {
  rmSync(folder, { recursive: true });
  await browser.close();
});

it("goes from the second reading to a signed and released report, and locks the text", async () => {
  const reader = await signedIn(browser, "second.investigator@calderstreet.example");
  const address = await caseAddress(reader.page, NUMBER);
  await reader.page.goto(`${address}/sign-off`);
  await reader.page.getByLabel("Note").fill("Arithmetic checked by hand.");
  await reader.page.getByRole("button", { name: "Record the reading" }).click();
  await reader.page.getByText("8 of 8 met").waitFor();

  const investigator = await signedIn(browser, "investigator@calderstreet.example");
  await investigator.page.goto(`${address}/sign-off`);
  await investigator.page.getByRole("button", { name: "Send for sign-off" }).click();
  await investigator.page
    .getByText("Only the lead engineer can sign a findings report.")
    .first()
    .waitFor();

  const lead = await signedIn(browser, "lead@calderstreet.example");
  await lead.page.goto(`${address}/sign-off`);
  await lead.page.getByRole("button", { name: "Sign the findings" }).click();
  await lead.page.getByLabel("I have read all sections and the figures.").check();
  await lead.page.getByLabel("I did not make the measurements this rests on.").check();
  await lead.page.getByLabel("Your password").fill("not the password");
  await lead.page.getByRole("button", { name: "Sign and lock" }).click();
  await lead.page.getByText("Nothing was signed", { exact: true }).waitFor();

  await lead.page.getByLabel("Your password").fill(DEMO_PASSWORD);
  await lead.page.getByRole("button", { name: "Sign and lock" }).click();
  await lead.page.getByRole("dialog").waitFor({ state: "detached" });
  await expect
    .poll(async () => (await lead.page.request.get(`/api${address}/report/1.pdf`)).status(), {
      timeout: 60_000,
      interval: 500,
    })
    .toBe(200);

  const pdf = await lead.page.request.get(`/api${address}/report/1.pdf`);
  const file = path.join(folder, "report.pdf");
  writeFileSync(file, await pdf.body());
  const words = execFileSync("pdftotext", ["-layout", file, "-"], { encoding: "utf8" });
  expect(words).toContain(NUMBER);
  expect(words).toContain("Mara Quist");
  expect(words).toContain("Bending fatigue at the tooth roots");
  expect(words).not.toContain("not signed");

  await investigator.page.goto(`${address}/findings`);
  const sheet = investigator.page.locator("[contenteditable=true]");
  expect(await sheet.count()).toBe(0);
});
