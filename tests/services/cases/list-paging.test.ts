import { beforeAll, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/auth/actor";
import { CASE_STATES } from "@/lib/cases/constants";
import { encodeCursor } from "@/lib/cases/cursor";
import { DIRECTIONS, PAGE_SIZE, SORTS } from "@/lib/cases/list-params";
import { idsOf, listOf, manyCases, walk } from "../../helpers/case-lists";
import { asLead, asRequester } from "../../helpers/people";

const ORDERS = SORTS.flatMap((sort) => DIRECTIONS.map((dir) => ({ sort, dir })));

/** Titles that are equal, that differ only to some, and that are long in an address. */
const TITLES = [
  "",
  "A shaft that broke",
  "a SHAFT that broke",
  "Ä shaft that broke ",
  "Wälzlager ×4 – „Ø“ ".repeat(6),
  "軸が折れた".repeat(24),
  "🪛".repeat(100),
  `"\\\u0001`.repeat(60),
];
const DAYS = [null, "2026-11-30", "2026-12-24"];
const CHANGED = [new Date("2026-11-01T08:00:00.000Z"), new Date("2026-11-01T08:00:00.001Z")];

let requester: Actor;
let all: string[];
beforeAll(async () => {
  requester = await asRequester();
  // More drafts than a page holds: they have no number, and a list by number still shows them all.
  const states = [
    ...Array.from({ length: PAGE_SIZE + 10 }, () => "draft" as const),
    ...Array.from({ length: 90 }, (_, i) => CASE_STATES[i % CASE_STATES.length]),
  ];
  all = await manyCases(
    states.map((state = "submitted", i) => ({
      state,
      title: TITLES[i % TITLES.length],
      dueOn: DAYS[i % DAYS.length],
      changedAt: CHANGED[i % CHANGED.length],
    })),
  );
});

describe("page after page of all cases", () => {
  it.each(ORDERS)("by $sort $dir shows every case exactly once", async (order) => {
    const seen = await walk(requester, { view: "all", ...order });
    expect(seen).toHaveLength(all.length);
    expect([...seen].sort()).toEqual([...all].sort());
  });

  it.each(SORTS)("by %s runs backwards the same way", async (sort) => {
    const rising = await walk(requester, { view: "all", sort, dir: "asc" });
    const falling = await walk(requester, { view: "all", sort, dir: "desc" });
    expect(falling).toEqual([...rising].reverse());
  });

  it("holds no more than a page, and says when there is no next", async () => {
    const first = await listOf(requester, "view=all");
    expect(first.rows).toHaveLength(PAGE_SIZE);
    expect(first.next).not.toBeNull();
    expect((await listOf(requester, "view=all&q=2026-2001")).next).toBeNull();
  });

  it("puts rows in the order that is asked for", async () => {
    const { rows } = await listOf(requester, "view=all&sort=number&dir=desc");
    const numbers = rows.map(({ number }) => number);
    expect(numbers).toEqual([...numbers].sort().reverse());
  });
});

describe("a place in the list that nobody gave out", () => {
  const places = [
    "x",
    "%00",
    "'; drop table cases; --",
    encodeCursor(["not a date", "case_1"]),
    encodeCursor([Number.MAX_VALUE, "case_1"]),
    encodeCursor([-1, "日本"]),
    encodeCursor(["", ""]),
    encodeCursor([null, "case_1"]),
    encodeCursor(["2026-13-45T99:00:00Z", "case_1"]),
  ];
  it.each(ORDERS)("by $sort $dir gives a page and no failure", async ({ sort, dir }) => {
    for (const after of places) {
      const address = new URLSearchParams({ view: "all", sort, dir, after }).toString();
      const { rows } = await listOf(requester, address);
      expect(rows.length).toBeLessThanOrEqual(PAGE_SIZE);
    }
  });

  it("starts at the beginning where it cannot be read", async () => {
    const first = await idsOf(requester, "view=all");
    expect(await idsOf(requester, "view=all&after=x")).toEqual(first);
    expect(await idsOf(requester, `view=all&after=${"x".repeat(5000)}`)).toEqual(first);
  });
});

describe("page after page while others add cases", () => {
  it.each(ORDERS)("by $sort $dir shows each case of the start exactly once", async (order) => {
    const lead = await asLead();
    const before = await walk(lead, { view: "all", ...order });
    const seen = await walk(lead, { view: "all", ...order }, async () => {
      await manyCases(
        TITLES.slice(0, 4).map((title, i) => ({ title, dueOn: DAYS[i % DAYS.length] })),
      );
    });
    const known = new Set(before);
    expect(seen.filter((id) => known.has(id))).toEqual(before);
    expect(new Set(seen).size).toBe(seen.length);
  });
});
