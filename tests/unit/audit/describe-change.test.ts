import { describe, expect, test } from "vitest";
import { describeChange, idsIn } from "@/lib/audit/describe-change";

const PERSON = "per_0mx4mit1zd1t25zawtjmcpfp";
const ITEM = "rec_0mwopxsga1t1jn0wma74be78";
const names = new Map([
  [PERSON, "Sanna Reeve"],
  [ITEM, "E1.1"],
]);
const plain = (text: string | null) => text?.replace(/[\u00a0\u202f]/g, " ") ?? null;
const lines = (before: unknown, after: unknown) =>
  describeChange(before, after, names).map(
    (line) => `${line.label}: ${plain(line.before) ?? "–"} > ${plain(line.after) ?? "–"}`,
  );

describe("what an entry of the history changed", () => {
  test("is told in the words of the screens, with what stayed left out", () => {
    expect(
      lines(
        { state: "examining", priority: "P2", dueOn: "2026-12-11" },
        { state: "analysing", priority: "P2", dueOn: "2026-12-18" },
      ),
    ).toEqual(["State: Examining > Weighing", "Due: 11 Dec 2026 > 18 Dec 2026"]);
  });

  test("names people and records in place of their ids", () => {
    expect(idsIn({ a: [PERSON], b: { c: ITEM }, d: "reason" })).toEqual([PERSON, ITEM]);
    expect(
      lines(null, { secondReaderId: PERSON, details: { itemId: ITEM, technique: "sem_se" } }),
    ).toEqual([
      "Second reader: – > Sanna Reeve",
      "Item: – > E1.1",
      "Taken with: – > Scanning electron microscope, secondary electrons",
    ]);
  });

  test("keeps an id that stands for nothing known", () => {
    expect(lines(null, { leadId: "per_000000000000000000000000" })).toEqual([
      "Lead engineer: – > per_000000000000000000000000",
    ]);
  });

  test("shows answers of the field return by their questions", () => {
    expect(
      lines(
        { answers: { partName: { kind: "value", value: "Shaft" } } },
        {
          answers: {
            partName: { kind: "value", value: "Hoist drum shaft" },
            coating: { kind: "unknown", why: "Not on the drawing" },
          },
        },
      ),
    ).toEqual(["Part: Shaft > Hoist drum shaft", "Coating: – > Not known: Not on the drawing"]);
  });

  test("puts ranges and drawn shapes in short", () => {
    const line = (x: number) => ({
      tool: "front",
      points: [
        [0, 0],
        [x, 1],
      ],
    });
    expect(lines(null, { requiredDepthMm: { min: 2.5, max: 4 } })).toEqual([
      "Required depth: – > 2.5 to 4 mm",
    ]);
    expect(lines({ geometry: line(1) }, { geometry: line(2) })).toEqual([
      "Geometry: Front, 2 points > Front, 2 points",
    ]);
    expect(lines({ geometry: line(1) }, { geometry: line(1) })).toEqual([]);
  });

  test("has nothing to say where nothing was or became", () => {
    expect(lines(null, null)).toEqual([]);
    expect(lines({ note: "" }, { note: null })).toEqual([]);
  });

  test("takes whatever an entry may hold", () => {
    expect(
      lines(
        { __proto__: null, constructor: "x" },
        { constructor: "y", answers: { nonsense: 7, partName: 3 } },
      ),
    ).toEqual(["Constructor: x > y", "nonsense: – > 7"]);
    expect(lines("text", ["a", "b"])).toEqual(["Value: text > a, b"]);
  });
});
