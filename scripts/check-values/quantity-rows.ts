import { difference, UnsupportedRow, type RowResult } from "./check-row";
import type { CsvRow } from "./csv";
import { FASTENER_QUANTITIES } from "./fastener-quantities";
import { INDENT_QUANTITIES } from "./indent-quantities";
import type { Quantity } from "./quantity";
import { STATISTICS_QUANTITIES } from "./statistics-quantities";
import { TRAVERSE_QUANTITIES } from "./traverse-quantities";

export const QUANTITY_COLUMNS = [
  "id",
  "quantity",
  "inputs",
  "expected",
  "tol",
  "tol_kind",
] as const;

const QUANTITIES: ReadonlyMap<string, Quantity> = new Map(
  [INDENT_QUANTITIES, STATISTICS_QUANTITIES, TRAVERSE_QUANTITIES, FASTENER_QUANTITIES].flatMap(
    (group) => Object.entries(group),
  ),
);

function readInputs(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    throw new UnsupportedRow(`the inputs are not JSON (${why})`);
  }
}

/** One computed quantity, through the same functions that the portal uses. */
export function checkQuantityRow(row: CsvRow): RowResult {
  const { id = "", quantity: name = "", inputs = "", expected = "", tol = "" } = row;
  const compute = QUANTITIES.get(name);
  if (!compute) return { id, status: "unsupported", reason: `no calculation named "${name}"` };
  try {
    const computed = compute(readInputs(inputs));
    const reason = difference(computed, { expected, tol, tolKind: row.tol_kind ?? "" });
    return reason === null ? { id, status: "passed" } : { id, status: "failed", reason };
  } catch (error) {
    if (error instanceof UnsupportedRow)
      return { id, status: "unsupported", reason: error.message };
    throw error;
  }
}
