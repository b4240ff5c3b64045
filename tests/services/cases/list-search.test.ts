import { beforeAll, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/auth/actor";
import { countCases } from "@/lib/cases/list-cases";
import { parseListParams, SEARCH_MAX } from "@/lib/cases/list-params";
import { listOf, manyCases } from "../../helpers/case-lists";
import { asLead } from "../../helpers/people";

const TITLES = [
  "Hoist shaft, broken at the journal fillet",
  "Hoist drum bolt, thread stripped",
  "Gear tooth of the bull gear, spalled",
  "Wälzlager, Außenring gebrochen",
  "T6 extrusion, cracked",
  "The",
  "100% torn_off",
  "'; drop table cases; --",
];

let lead: Actor;
beforeAll(async () => {
  lead = await asLead();
  await manyCases([
    ...TITLES.map((title) => ({ title })),
    { title: "Pin", serialNumber: "SN-0417", drawingNumber: "HB-2210", material: "42CrMo4" },
    { title: "Spring", number: "RL-2025-0042" },
  ]);
});

const search = async (q: string) => {
  const query = new URLSearchParams({ view: "all", q }).toString();
  return (await listOf(lead, query)).rows.map(({ title }) => title);
};

describe("searching the case list", () => {
  it.each([
    ["one word", "shaft", [TITLES[0]]],
    ["the beginning of a word", "broke", [TITLES[0]]],
    ["two words, in any order", "bolt hoist", [TITLES[1]]],
    ["every word has to be there", "hoist gear", []],
    ["capitals and letters without their dots", "WALZLAGER", [TITLES[3]]],
    ["a serial number", "0417", ["Pin"]],
    ["a drawing number", "HB-2210", ["Pin"]],
    ["a material", "42CrMo4", ["Pin"]],
    ["a case number", "RL-2025-0042", ["Spring"]],
    ["the beginning of a case number", "2025-00", ["Spring"]],
    ["words that are too short for the index, from the beginning of a title", "T6", [TITLES[4]]],
    ["a word beside one that is left out", "the drum", [TITLES[1]]],
    ["one letter", "g", [TITLES[2]]],
    ["a word that is nowhere", "turbine", []],
  ])("finds %s: %s", async (_name, typed, found) => {
    expect(await search(typed)).toEqual(found);
  });

  it.each(["", "   ", "\t\n"])("shows everything for %j", async (typed) => {
    expect(await search(typed)).toHaveLength(TITLES.length + 2);
  });

  it("looks for titles that begin so where only words without weight are typed", async () => {
    expect(await search("the")).toEqual(["The"]);
    expect(await search("was it the")).toEqual([]);
  });
});

describe("what is typed is never an order to the database", () => {
  it.each([
    '"hoist shaft"',
    "+hoist -shaft",
    "hoist*",
    "-shaft",
    "+",
    "++--**",
    "@8 hoist",
    '"hoist shaft" @4',
    "<hoist >shaft",
    "(hoist (shaft",
    ")))",
    "~hoist",
    '"',
    "'",
    "\\",
    "`",
    "hoist\u0000shaft",
    "%",
    "_",
    "100%",
    "' or '1'='1",
    "'; drop table cases; --",
    "/* */ union select 1 --",
    "日本語の軸",
    "🪛",
    "s\u0301haft",
    "\ud83d",
    "x".repeat(SEARCH_MAX),
    "+x*".repeat(60),
    "a b c d e ".repeat(20),
  ])("%j gives an answer", async (typed) => {
    const found = await search(typed);
    expect(found.length).toBeLessThanOrEqual(TITLES.length + 2);
    const query = { view: "all", q: typed };
    expect(await countCases(lead, parseListParams(query), 100)).toBe(found.length);
  });

  it("takes the signs of the search language for spaces", async () => {
    for (const typed of ['"hoist shaft"', "+hoist -shaft", "<hoist >shaft", "(hoist (shaft"]) {
      expect([typed, await search(typed)]).toEqual([typed, [TITLES[0]]]);
    }
  });

  it("takes the signs of LIKE for themselves", async () => {
    expect(await search("%")).toEqual([]);
    expect(await search("_")).toEqual([]);
    expect(await search("\\")).toEqual([]);
  });

  it("leaves every case where it was", async () => {
    expect(await search("")).toHaveLength(TITLES.length + 2);
  });
});
