import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { sourceFiles } from "../architecture/project-files";
import { accessProblems, caseAddress, isTooWide, openBrowser, signedIn, signedOut } from "./portal";

const DESK = { width: 1920, height: 1080, theme: "light" as const };
const TABLET = { width: 1024, height: 768, theme: "light" as const };

/** Addresses as the framework makes them from the files: "/cases/[caseId]/images". */
const ADDRESSES = sourceFiles("app")
  .map((file) => file.path)
  .filter((file) => file.endsWith("/page.tsx"))
  .map((file) => file.replace(/^app|\/page\.tsx$|\/\([^)]+\)/g, "") || "/")
  .sort();
const PUBLIC = ["/sign-in", "/forgotten", "/set-up", "/set-password/[token]"];
const whoOpens = (address: string): Visitor =>
  PUBLIC.includes(address) ? "visitor" : address.startsWith("/admin") ? "administrator" : "lead";

type Visitor = "lead" | "administrator" | "visitor";
type Window = Awaited<ReturnType<typeof signedOut>>;

let browser: Browser;
let windows: Record<Visitor, Window>;
let ids: Record<string, string>;

async function idOn(page: Page, path: string, pattern: RegExp): Promise<string> {
  await page.goto(path);
  await page.waitForLoadState("networkidle");
  for (const link of await page.getByRole("link").all()) {
    const id = pattern.exec((await link.getAttribute("href")) ?? "")?.[1];
    if (id) return id;
  }
  throw new Error(`no link like ${pattern.source} on ${path}`);
}

async function problemsOf({ page, faults }: Window, path: string): Promise<string[]> {
  const before = faults.length;
  await page.goto(path);
  await page.waitForLoadState("networkidle");
  const headings = await page.getByRole("heading", { level: 1 }).count();
  return [
    ...((await isTooWide(page)) ? ["wider than its window"] : []),
    ...(headings === 1 ? [] : [`${headings} headings of the first level`]),
    ...(await accessProblems(page)),
    ...faults.slice(before),
  ];
}

beforeAll(async () => {
  browser = await openBrowser();
  const lead = await signedIn(browser, "lead@calderstreet.example", DESK);
  const address = await caseAddress(lead.page, "RL-2026-0142");
  ids = {
    caseId: address.split("/")[2] ?? "",
    imageId: await idOn(lead.page, `${address}/images`, /\/images\/([^/?]+)$/),
    traverseId: await idOn(lead.page, `${address}/hardness`, /\/hardness\/(rec_[^/?]+)$/),
    tableId: await idOn(lead.page, "/reference", /\/reference\/([^/?]+)$/),
    token: "nobody-was-invited-by-this",
  };
  windows = {
    lead,
    administrator: await signedIn(browser, "admin@calderstreet.example", DESK),
    visitor: await signedOut(browser, DESK),
  };
});
afterAll(() => browser.close());

describe("every page there is keeps the rules of access, on a large screen", () => {
  it.each(ADDRESSES)("%s", async (address) => {
    const path = address.replace(/\[(\w+)\]/g, (_, name: string) => {
      const id = ids[name];
      if (id === undefined) throw new Error(`no sample for ${name}`);
      return id;
    });
    expect(await problemsOf(windows[whoOpens(address)], path)).toEqual([]);
  });
});

describe("what a requester sees keeps them, on a tablet", () => {
  let requester: Window;
  beforeAll(async () => {
    requester = await signedIn(browser, "requester@harrowbay.example", TABLET);
  });

  it.each([
    { number: "RL-2026-0134", path: "" },
    { number: "RL-2026-0134", path: "/field-return" },
    { number: "RL-2026-0134", path: "/report" },
    { number: "RL-2026-0147", path: "" },
  ])("$number at $path", async ({ number, path }) => {
    const address = await caseAddress(requester.page, number);
    expect(await problemsOf(requester, address + path)).toEqual([]);
  });

  it.each(["/cases", "/cases/new"])("%s", async (path) => {
    expect(await problemsOf(requester, path)).toEqual([]);
  });
});
