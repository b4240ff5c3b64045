import { describe, expect, it } from "vitest";
import { decodeCursor, encodeCursor } from "@/lib/cases/cursor";
import { dueGroup } from "@/lib/cases/due-group";
import { listQuery, parseListParams } from "@/lib/cases/list-params";
import { caseNumberPrefix, fullTextQuery } from "@/lib/cases/search-terms";

describe("search words", () => {
  it("asks for every word from its beginning", () => {
    expect(fullTextQuery("Hoist shaft HB-2210")).toBe("+hoist* +shaft* +2210*");
  });
  it("takes no operator from what was typed", () => {
    expect(fullTextQuery('+"drum" -bolt* @8 (x)')).toBe("+drum* +bolt*");
  });
  it("is null when nothing typed is in the index", () => {
    expect(fullTextQuery("the is")).toBeNull();
    expect(fullTextQuery("R3")).toBeNull();
  });
  it("knows a case number and its beginning", () => {
    expect(caseNumberPrefix("rl-2026-0142")).toBe("RL-2026-0142");
    expect(caseNumberPrefix("2026-01")).toBe("RL-2026-01");
    expect(caseNumberPrefix("42CrMo4")).toBeNull();
  });
});

describe("the place in a list", () => {
  it("comes back as it was, whatever the title holds", () => {
    for (const value of ["Wälzlager ×4 – „Ø“", "", 2_739_000]) {
      expect(decodeCursor(encodeCursor([value, "case_1"]))).toEqual([value, "case_1"]);
    }
  });
  it("starts anew when it cannot be read", () => {
    expect(decodeCursor("not a place")).toBeNull();
    expect(decodeCursor(encodeCursor(["a", "b"]).slice(2))).toBeNull();
  });
});

describe("the address of the list", () => {
  it("says only what differs from the usual", () => {
    expect(listQuery(parseListParams({}))).toBe("");
    expect(
      listQuery(parseListParams({ q: "bolt", stages: "3-4", sort: "title", dir: "desc" })),
    ).toBe("q=bolt&stages=3-4&sort=title&dir=desc");
  });
  it("drops what it does not know", () => {
    const params = parseListParams({ sort: "password", dir: "up", stages: "9-x-2", hold: "maybe" });
    expect(params).toMatchObject({ sort: "due", dir: "asc", stages: [2], hold: "" });
  });
  it("starts at the first page when anything changes", () => {
    expect(listQuery(parseListParams({ after: "abc", q: "x" }), { q: "y" })).toBe("q=y");
  });
});

describe("due groups", () => {
  const now = new Date("2026-12-01T12:00:00Z");
  it.each([
    ["examining", "2026-11-30", "Late"],
    ["examining", "2026-12-01", "Due within 14 days"],
    ["examining", "2026-12-15", "Due within 14 days"],
    ["examining", "2026-12-16", "Due later"],
    ["submitted", null, "No date yet"],
    ["released", "2026-11-01", "Signed"],
    ["closed", "2026-11-01", "Ended"],
    ["draft", null, "Drafts"],
  ] as const)("%s due %s is %s", (state, dueOn, group) => {
    expect(dueGroup({ state, dueOn }, now)).toBe(group);
  });
});
