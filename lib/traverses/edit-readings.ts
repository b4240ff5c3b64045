import type { ParsedBlock } from "@/lib/hardness/parse-block";
import { parseNumberCell } from "@/lib/hardness/parse-cell";
import { CELL_MAX, type TypedReading } from "./schemas";
import { isBlankReading, type CellName } from "./typed-cells";

/** Next free name of a row; names are never used twice within a traverse. */
function namer(readings: readonly TypedReading[]): () => string {
  let last = readings.reduce(
    (most, { id }) => Math.max(most, Number(/^r(\d+)$/.exec(id)?.[1] ?? 0)),
    0,
  );
  return () => `r${++last}`;
}

/** A number is kept with a point and the places typed; anything else stays as it is. */
export function tidyCell(typed: string): string {
  const text = typed.trim();
  const parsed = parseNumberCell(text);
  return "value" in parsed ? text.replace(",", ".").replace("\u2212", "-") : text;
}

/** The rows with one cell changed; a row past the end is made. */
export function withCell(
  readings: readonly TypedReading[],
  index: number,
  cell: CellName,
  typed: string,
): TypedReading[] {
  const next = [...readings];
  const newId = namer(readings);
  while (next.length <= index) next.push({ id: newId() });
  const row = next[index];
  if (row) next[index] = { ...row, [cell]: typed };
  return next;
}

export function withReading(
  readings: readonly TypedReading[],
  id: string,
  change: (reading: TypedReading) => TypedReading,
): TypedReading[] {
  return readings.map((reading) => (reading.id === id ? change(reading) : reading));
}

type ReadBlock = Extract<ParsedBlock, { status: "read" }>;

/** Writes a pasted block from a row on, over what stands there; cells that cannot be read keep their words. */
export function withBlock(
  readings: readonly TypedReading[],
  from: number,
  block: ReadBlock,
): TypedReading[] {
  const newId = namer(readings);
  const names: readonly CellName[] =
    block.columns === "depth_diagonals" ? ["depth", "d1", "d2"] : ["depth", "hardness"];
  const pasted = block.rows.map((row, offset): TypedReading => {
    const cells = Object.fromEntries(
      names.map((name, column) => [name, tidyCell(row.cells[column] ?? "").slice(0, CELL_MAX)]),
    );
    const note = row.note === null ? {} : { note: row.note.slice(0, CELL_MAX) };
    return { id: readings[from + offset]?.id ?? newId(), ...cells, ...note };
  });
  return [...readings.slice(0, from), ...pasted, ...readings.slice(from + pasted.length)];
}

/** What is saved: rows in which something was typed, cells without empty ones. */
export function filledReadings(readings: readonly TypedReading[]): TypedReading[] {
  return readings
    .filter((reading) => !isBlankReading(reading))
    .map(
      (reading) =>
        Object.fromEntries(
          Object.entries(reading).filter(([, value]) => value !== undefined && value !== ""),
        ) as TypedReading,
    );
}
