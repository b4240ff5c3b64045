import type { Browser, Locator, Page } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { accessProblems, caseAddress, DEMO_PASSWORD, openBrowser, signedIn } from "./portal";

const WRITER = "investigator@calderstreet.example";
const OTHER_WRITER = "second.lead@calderstreet.example";
const READER = "second.investigator@calderstreet.example";

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

async function openFindings(email: string, number = "RL-2026-0142") {
  const { page, faults } = await signedIn(browser, email);
  await page.goto(`${await caseAddress(page, number)}/findings`);
  await page.getByRole("textbox", { name: "Findings" }).waitFor();
  return { page, faults };
}

const text = (page: Page): Locator => page.getByRole("textbox", { name: "Findings" });

/** The cursor at the end of the first paragraph that holds these words. */
async function cursorAfter(page: Page, words: string | RegExp): Promise<void> {
  const paragraph = text(page).locator("p").filter({ hasText: words }).first();
  await paragraph.click();
  await paragraph.evaluate((element) => {
    const range = document.createRange();
    range.selectNodeContents(element);
    range.collapse(false);
    window.getSelection()?.removeAllRanges();
    window.getSelection()?.addRange(range);
  });
}

const saved = (page: Page) => page.getByText(/^Saved \d/).waitFor();
/** Does something, and waits until the server has the text that comes of it. */
async function andSaved(
  page: Page,
  work: () => Promise<void>,
  then: "here" | "elsewhere" = "here",
): Promise<void> {
  const answer = page.waitForResponse(
    (response) => response.request().method() === "PUT" && response.status() === 200,
  );
  await work();
  await answer;
  if (then === "here") await saved(page);
}
const reload = async (page: Page) => {
  await page.reload();
  await text(page).waitFor();
};

it("puts in a picture without its marks, a chart and a cited value, and they are there after a reload", async () => {
  const { page, faults } = await openFindings(WRITER);
  const figures = text(page).locator("figure");
  const before = await figures.count();

  await cursorAfter(page, "Why the shaft broke");
  await page.getByRole("button", { name: "Picture" }).click();
  await page.getByRole("dialog", { name: "Put in a picture" }).getByText("IM-03").click();
  const picture = figures.filter({ has: page.getByRole("checkbox", { name: "Marks drawn in" }) });
  const own = picture.filter({ hasText: "IM-03" }).first();
  const withMarks = await own.locator("img").getAttribute("src");
  await own.getByRole("checkbox").uncheck();
  const without = await own.locator("img").getAttribute("src");
  expect(without).not.toBe(withMarks);
  for (const src of [withMarks, without]) {
    const answer = await page.request.get(src ?? "");
    expect([answer.status(), answer.headers()["content-type"]]).toEqual([200, "image/jpeg"]);
  }
  await own.getByLabel("Caption").fill("Fracture face, without marks");

  await cursorAfter(page, "Why the shaft broke");
  await page.getByRole("button", { name: "Chart of a traverse" }).click();
  await page.getByRole("dialog", { name: "Put in a chart" }).getByText("T1").click();

  await cursorAfter(page, "Why the shaft broke");
  await page.keyboard.type(" @");
  await page.keyboard.type("SHD T1");
  await page.keyboard.press("Enter");
  await andSaved(page, () => page.keyboard.type("is the depth at mid-journal."));
  const cited = text(page)
    .locator("p")
    .filter({ hasText: "is the depth at mid-journal." })
    .locator("[data-state=current]");
  await cited.waitFor();

  await reload(page);
  expect(await figures.count()).toBe(before + 2);
  const kept = figures.filter({ hasText: "Fracture face, without marks" });
  expect(await kept.getByRole("checkbox", { name: "Marks drawn in" }).isChecked()).toBe(false);
  expect(await kept.locator("img").getAttribute("src")).toBe(without);
  expect(await cited.textContent()).toMatch(/mm.*T1/);
  expect(await accessProblems(page)).toEqual([]);
  expect(faults).toEqual([]);
  await page.context().close();
});

it("settles stale values: one by the new value, one kept with its reason", async () => {
  const { page, faults } = await openFindings(WRITER);
  const stale = page.getByRole("status", { name: "Stale values" });
  await stale.getByText("2 cited values are stale").waitFor();
  expect(await text(page).locator("[data-state=stale]").count()).toBe(2);
  await page.keyboard.press("Alt+ArrowDown");

  await stale.getByRole("button", { name: "Take the new value" }).first().click();
  await stale.getByText("1 cited value is stale").waitFor();
  await stale.getByRole("button", { name: "Keep, say why" }).click();
  await stale.getByLabel("Why the old value stays").fill("Read before the polish.");
  await andSaved(page, () => stale.getByRole("button", { name: "Keep it" }).click());
  await stale.waitFor({ state: "detached" });

  await reload(page);
  expect(await text(page).locator("[data-state=stale]").count()).toBe(0);
  expect(await text(page).locator("[data-state=kept]").count()).toBe(1);
  expect(faults).toEqual([]);
  await page.context().close();
});

it("shows two writers both texts, and loses neither whichever is taken", async () => {
  const first = await openFindings(WRITER);
  const second = await openFindings(OTHER_WRITER);
  await cursorAfter(first.page, "The shaft broke by bending fatigue");
  await andSaved(first.page, () => first.page.keyboard.type(" First writer."));

  const mine = second.page;
  await cursorAfter(mine, "The shaft broke by bending fatigue");
  await mine.keyboard.type(" Second writer.");
  await mine.getByText("Findings were not saved.").waitFor();
  const answer = mine.getByRole("region", { name: "Answer", exact: true });
  await answer.getByText("First writer.").waitFor();
  await answer.getByText("Second writer.").waitFor();

  await mine.getByRole("button", { name: "Take theirs" }).click();
  await text(mine).getByText("First writer.").waitFor();
  expect(await text(mine).getByText("Second writer.").count()).toBe(0);
  await reload(mine);
  await mine.getByRole("button", { name: "Put it back" }).click();
  await mine.getByText("Findings were not saved.").waitFor();
  await andSaved(mine, () => mine.getByRole("button", { name: "Keep mine" }).click());
  await reload(mine);
  await text(mine).getByText("Second writer.").waitFor();
  expect(await text(mine).getByText("First writer.").count()).toBe(0);
  expect(await mine.getByRole("button", { name: "Put it back" }).count()).toBe(0);
  expect(first.faults).toEqual([]);
  // The refused save is the one thing the browser itself reports.
  expect(second.faults.filter((fault) => !fault.includes("409"))).toEqual([]);
  await first.page.context().close();
  await mine.context().close();
});

it("shows what was written last after going on and coming back, and saves on from there", async () => {
  const { page, faults } = await openFindings(WRITER);
  await cursorAfter(page, "Why the shaft broke");
  await andSaved(
    page,
    async () => {
      await page.keyboard.type(" Written before going on.");
      await page.getByRole("link", { name: /^Weighing/ }).click();
      await page.getByRole("heading", { name: "Weighing" }).waitFor();
    },
    "elsewhere",
  );
  await page.goBack();
  await text(page).getByText("Written before going on.").waitFor();
  await cursorAfter(page, "Written before going on.");
  await andSaved(page, () => page.keyboard.type(" Written after."));
  expect(faults).toEqual([]);
  await page.context().close();
});

it("goes on without a connection and sends what was written when it is back", async () => {
  const { page } = await openFindings(WRITER);
  await page.context().setOffline(true);
  await cursorAfter(page, "Why the shaft broke");
  await page.keyboard.type(" Written without a connection.");
  await page.getByText("No connection.", { exact: false }).first().waitFor();
  await page.getByText(/You can go on; .* kept on this device/).waitFor();
  await andSaved(page, () => page.context().setOffline(false));
  await reload(page);
  await text(page).getByText("Written without a connection.").waitFor();
  await page.context().close();
});

it("keeps what was written when the sign-in ends, and saves it after signing in again", async () => {
  const { page } = await openFindings(WRITER);
  const address = page.url();
  await page.context().clearCookies();
  await cursorAfter(page, "Why the shaft broke");
  await page.keyboard.type(" Written after the sign-in ended.");
  await page.getByText("You are signed out.").waitFor();

  const opened = page.context().waitForEvent("page");
  await page.getByRole("link", { name: "Sign in in a new window" }).click();
  const again = await opened;
  await again.getByLabel("E-mail").fill(WRITER);
  await again.getByLabel("Password", { exact: true }).fill(DEMO_PASSWORD);
  await again.getByRole("button", { name: "Sign in" }).click();
  await again.waitForURL(address);
  await again.close();

  await andSaved(page, async () => {
    await page.bringToFront();
    // A browser without a screen gives no window the focus.
    await page.evaluate(() => window.dispatchEvent(new Event("focus")));
  });
  await reload(page);
  await text(page).getByText("Written after the sign-in ended.").waitFor();
  await page.context().close();
});

it("offers what was written after the sign-in ended, when one left the page to sign in", async () => {
  const { page } = await openFindings(WRITER);
  const address = page.url();
  await page.context().clearCookies();
  await cursorAfter(page, "Why the shaft broke");
  await page.keyboard.type(" Written before leaving.");
  await page.getByText("You are signed out.").waitFor();
  page.on("dialog", (dialog) => void dialog.accept());
  await page.goto(address);
  await page.getByLabel("E-mail").fill(WRITER);
  await page.getByLabel("Password", { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL(address);
  await andSaved(page, () => page.getByRole("button", { name: "Put it back" }).click());
  await reload(page);
  await text(page).getByText("Written before leaving.").waitFor();
  await page.context().close();
});

it("lets the second reader note what should change, and the author settle it beside the text", async () => {
  const reader = await openFindings(READER, "RL-2026-0127");
  const notes = (page: Page) => page.getByRole("region", { name: "Notes of the second reader" });
  expect(await reader.page.locator("[contenteditable=true]").count()).toBe(0);
  const passage = text(reader.page).locator("p").filter({ hasText: "items sent" }).first();
  await passage.selectText();
  await reader.page.keyboard.press("Control+Alt+m");
  await notes(reader.page).getByLabel("What should change").fill("Name the items.");
  await notes(reader.page).getByRole("button", { name: "Leave the note" }).click();
  await notes(reader.page).getByText("1 open").waitFor();
  expect(await text(reader.page).locator(".note-passage").textContent()).toContain("items sent");
  expect(await accessProblems(reader.page)).toEqual([]);

  const author = await openFindings(WRITER, "RL-2026-0127");
  await notes(author.page).getByText("Name the items.").waitFor();
  await notes(author.page).getByRole("button", { name: "Answer" }).click();
  await notes(author.page).getByLabel("Your answer").fill("They are in the annex.");
  await notes(author.page).getByRole("button", { name: "Answer" }).click();
  await notes(author.page).getByText("none open").waitFor();
  await notes(author.page).getByText("1 settled").click();
  await notes(author.page).getByText("They are in the annex.").waitFor();
  expect(await text(author.page).locator(".note-passage").count()).toBe(0);
  expect(await accessProblems(author.page)).toEqual([]);
  expect([...reader.faults, ...author.faults]).toEqual([]);
  await reader.page.context().close();
  await author.page.context().close();
});
