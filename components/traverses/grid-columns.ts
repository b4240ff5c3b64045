import { SCALES, type Scale } from "@/lib/hardness/scales";
import type { TraverseContent, TypedReading } from "@/lib/traverses/schemas";
import type { CellName } from "@/lib/traverses/typed-cells";

export type EntryMode = "diagonals" | "hardness";
export type TypedColumn = {
  name: CellName;
  head: string;
  sub?: string;
  unit: string;
  spoken: string;
};

const DEPTH: TypedColumn = { name: "depth", head: "Depth", unit: "mm", spoken: "depth" };
const TRACK: TypedColumn = { name: "track", head: "Row", unit: "1, 2", spoken: "row of indents" };
const LATERAL: TypedColumn = { name: "lateral", head: "Side", unit: "mm", spoken: "place along" };

export const hasAny = (readings: readonly TypedReading[], cell: CellName) =>
  readings.some((reading) => (reading[cell] ?? "") !== "");

/** Hardness typed and no diagonal anywhere: the grid asks for hardness. */
export function entryModeOf(readings: readonly TypedReading[]): EntryMode {
  return hasAny(readings, "hardness") && !hasAny(readings, "d1") ? "hardness" : "diagonals";
}

/** The white columns, from left to right. */
export function typedColumns(
  content: TraverseContent,
  mode: EntryMode,
  symbol: string,
): readonly TypedColumn[] {
  const { readings, method } = content;
  const diagonals: TypedColumn[] =
    method === "knoop"
      ? [{ name: "d1", head: "d", unit: "µm", spoken: "long diagonal" }]
      : [
          { name: "d1", head: "d", sub: "1", unit: "µm", spoken: "first diagonal" },
          { name: "d2", head: "d", sub: "2", unit: "µm", spoken: "second diagonal" },
        ];
  return [
    DEPTH,
    ...(hasAny(readings, "track") ? [TRACK] : []),
    ...(hasAny(readings, "lateral") ? [LATERAL] : []),
    ...(mode === "hardness"
      ? [{ name: "hardness" as const, head: symbol, unit: "typed", spoken: "hardness" }]
      : diagonals),
  ];
}

/** Head of a converted column: "≈ HRC", "≈ Rm". */
export const convertedHead = (to: Scale) =>
  to === "Rm_MPa" ? { head: "R", sub: "m", unit: "MPa" } : { head: SCALES[to].symbol, unit: "" };
