import "server-only";
import type { TableBlock, TableCell } from "./model";
import type { Column, Sheet } from "./sheet";
import { STYLES } from "./styles";

export const CELL_PAD_PT = 12;
/** Enough rows to know a column by; measuring thousands changes nothing that is seen. */
const SAMPLE_ROWS = 200;

/** Splits the column's width over the table's columns by what stands in them. */
export function tableColumns(block: TableBlock, sheet: Sheet, column: Column): Column[] {
  const count = block.columns.length;
  if (count === 0) return [];
  const least = new Array<number>(count).fill(12);
  const natural = new Array<number>(count).fill(12);
  const measure = (
    cells: readonly TableCell[],
    style: typeof STYLES.table | typeof STYLES.tableHead,
  ) => {
    let at = 0;
    for (const cell of cells) {
      const span = cell.columnSpan ?? 1;
      if (span === 1 && at < count) {
        const { wordPt, linePt } = sheet.type.extent(cell.runs, style);
        least[at] = Math.max(least[at] ?? 0, Math.min(wordPt, column.width * 0.4));
        natural[at] = Math.max(natural[at] ?? 0, linePt);
      }
      at += span;
    }
  };
  for (const row of block.head) measure(row, STYLES.tableHead);
  for (const row of block.rows.slice(0, SAMPLE_ROWS)) measure(row, STYLES.table);
  const room = Math.max(count * 8, column.width - CELL_PAD_PT * count);
  const widths = share(least, natural, room);
  let x = column.x;
  return widths.map((width) => {
    const placed = { x, width };
    x += width + CELL_PAD_PT;
    return placed;
  });
}

function share(least: readonly number[], natural: readonly number[], room: number): number[] {
  const leastSum = sum(least);
  const naturalSum = sum(natural);
  if (naturalSum <= room) return natural.map((width) => (width * room) / naturalSum);
  if (leastSum >= room) return least.map((width) => (width * room) / leastSum);
  const part = (room - leastSum) / (naturalSum - leastSum);
  return least.map((width, i) => width + ((natural[i] ?? width) - width) * part);
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
