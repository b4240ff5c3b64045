import { parseNumberCell, type CellProblem } from "@/lib/hardness/parse-cell";
import type { TypedReading } from "./schemas";

export type CellName = "depth" | "d1" | "d2" | "hardness" | "lateral" | "track";
export type ReadCell = { value: number | null; problem: CellProblem | null };

const WHAT: Record<CellName, string> = {
  depth: "A depth",
  d1: "A diagonal",
  d2: "A diagonal",
  hardness: "A hardness",
  lateral: "A place",
  track: "A row of indents",
};

/** One cell as a number; an empty cell is neither a number nor a problem. */
export function readCell(name: CellName, typed: string | undefined): ReadCell {
  if (typed === undefined || typed.trim() === "") return { value: null, problem: null };
  const parsed = parseNumberCell(typed);
  if ("problem" in parsed) return { value: null, problem: parsed.problem };
  const { value } = parsed;
  if (name === "lateral") return { value, problem: null };
  if (name === "depth")
    return value < 0
      ? {
          value: null,
          problem: { code: "negative_depth", text: "A depth below zero lies outside the piece." },
        }
      : { value, problem: null };
  if (name === "track")
    return Number.isInteger(value) && value > 0 && value < 100
      ? { value, problem: null }
      : { value: null, problem: { code: "not_positive", text: "Number the rows 1, 2, 3." } };
  return value > 0
    ? { value, problem: null }
    : {
        value: null,
        problem: { code: "not_positive", text: `${WHAT[name]} has to be above zero.` },
      };
}

export type FoundProblem = { readingId: string; number: number; cell: CellName; text: string };

export const CELL_NAMES: readonly CellName[] = [
  "depth",
  "d1",
  "d2",
  "hardness",
  "lateral",
  "track",
];

/** Every cell that cannot be read, and every depth that stands twice in one row of indents. */
export function cellProblems(readings: readonly TypedReading[]): readonly FoundProblem[] {
  const numberOfDepth = new Map<string, number>();
  return readings.flatMap((reading, index) => {
    const number = index + 1;
    const own = CELL_NAMES.flatMap((cell): FoundProblem[] => {
      const { problem } = readCell(cell, reading[cell]);
      return problem ? [{ readingId: reading.id, number, cell, text: problem.text }] : [];
    });
    const depth = readCell("depth", reading.depth).value;
    if (depth === null || reading.leftOutReason !== undefined) return own;
    const key = `${depth}/${readCell("track", reading.track).value ?? ""}`;
    const earlier = numberOfDepth.get(key);
    if (earlier === undefined) numberOfDepth.set(key, number);
    else
      own.push({
        readingId: reading.id,
        number,
        cell: "depth",
        text: `Indent ${earlier} has depth ${depth}\u00a0mm too. Correct one, or give each row of indents its number.`,
      });
    return own;
  });
}

/** Nothing typed in any cell. */
export function isBlankReading(reading: TypedReading): boolean {
  return CELL_NAMES.every((cell) => (reading[cell] ?? "").trim() === "") && !reading.note;
}
