import "server-only";
import type { Line } from "./lines";
import type { Run, TableBlock, TableCell } from "./model";
import { INK, RULE } from "./page-geometry";
import { baseline, type Column, type Sheet, type StructureElement } from "./sheet";
import { STYLES, type BlockStyle } from "./styles";
import { tableColumns } from "./table-columns";

const PAD_Y_PT = 3.75;

type Cell = { lines: Line[]; column: Column; align: "left" | "right" | "center"; span: number };
type Table = { block: TableBlock; sheet: Sheet; columns: Column[]; whole: Column; head: Cell[][] };

export function drawTable(
  block: TableBlock,
  sheet: Sheet,
  parent: StructureElement,
  column: Column,
): void {
  if (block.columns.length === 0) return;
  sheet.need(tableStartPt(block, sheet, column));
  sheet.space(4);
  const element = sheet.element(parent, "Table");
  const table = layOut(block, sheet, column);
  caption(table, element);
  if (table.head.length > 0) {
    const head = sheet.element(element, "THead");
    rule(table, INK, 1.1);
    for (const row of table.head) drawRow(table, row, "TH", sheet.element(head, "TR"));
  }
  rule(table, INK, table.head.length > 0 ? 0.75 : 1.1);
  const body = sheet.element(element, "TBody");
  block.rows.forEach((row, index) => {
    const cells = cellsOf(row, STYLES.table, table);
    const rowPt = rowHeightPt(cells, STYLES.table);
    if (rowPt + sheet.footnoteCostPt(marksOf(cells)) > sheet.roomPt && !sheet.atTop) {
      rule(table, INK, 0.75);
      continueOnNextPage(table);
    }
    drawRow(table, cells, "TD", sheet.element(body, "TR"));
    const last = index === block.rows.length - 1;
    rule(table, last ? INK : RULE, last ? 1.1 : 0.75);
  });
  sheet.y += 5;
  if (block.note) note(block.note, table, parent);
  sheet.y += 9;
}

/** Height of caption, head and first row, which are never parted. */
export function tableStartPt(block: TableBlock, sheet: Sheet, column: Column): number {
  const table = layOut(block, sheet, column);
  const first = block.rows[0];
  const firstPt = first ? rowHeightPt(cellsOf(first, STYLES.table, table), STYLES.table) : 0;
  const headPt = table.head.reduce((pt, row) => pt + rowHeightPt(row, STYLES.tableHead), 0);
  // A first row taller than this is cut over pages anyway.
  return (
    8 + captionLines(table).length * STYLES.tableCaption.leadingPt + headPt + Math.min(firstPt, 120)
  );
}

function layOut(block: TableBlock, sheet: Sheet, whole: Column): Table {
  const table: Table = {
    block,
    sheet,
    whole,
    columns: tableColumns(block, sheet, whole),
    head: [],
  };
  table.head = block.head.map((row) => cellsOf(row, STYLES.tableHead, table));
  return table;
}

function cellsOf(row: readonly TableCell[], style: BlockStyle, table: Table): Cell[] {
  const cells: Cell[] = [];
  let at = 0;
  for (const { runs, columnSpan = 1 } of row) {
    const first = table.columns[at];
    const span = Math.max(1, Math.min(columnSpan, table.columns.length - at));
    const last = table.columns[at + span - 1];
    if (!first || !last) break;
    const column = { x: first.x, width: last.x + last.width - first.x };
    const marked = table.sheet.withFootnoteMarks(runs);
    const lines = table.sheet.type.lines(marked, tabularWhereNumbers(runs, style), column.width);
    cells.push({ lines, column, align: table.block.columns[at]?.align ?? "left", span });
    at += span;
  }
  return cells;
}

/** Digits of equal width also widen hyphens, which tears words apart. */
function tabularWhereNumbers(runs: readonly Run[], style: BlockStyle): BlockStyle {
  const hyphenated = runs.some((run) => /\p{L}-\p{L}/u.test(run.text));
  return hyphenated ? { ...style, tabular: false } : style;
}

function rowHeightPt(cells: readonly Cell[], style: BlockStyle): number {
  const lines = Math.max(1, ...cells.map((cell) => cell.lines.length));
  return lines * style.leadingPt + 2 * PAD_Y_PT;
}

function marksOf(cells: readonly Cell[]): string[] {
  return cells.flatMap((cell) => cell.lines.flatMap((line) => line.footnotes));
}

/** Draws a row; one that is taller than a page goes on over as many as it takes. */
function drawRow(
  table: Table,
  cells: readonly Cell[],
  tag: "TH" | "TD",
  row: StructureElement,
): void {
  const { sheet } = table;
  const style: BlockStyle = tag === "TH" ? STYLES.tableHead : STYLES.table;
  const scope = tag === "TH" ? { scope: "Column" as const } : {};
  const elements = cells.map((cell) => {
    const element = sheet.element(row, tag, scope);
    // A cell over several columns is followed by empty ones, so that every row counts the same.
    for (let extra = 1; extra < cell.span; extra++) sheet.element(row, tag, scope);
    return element;
  });
  const total = Math.max(1, ...cells.map((cell) => cell.lines.length));
  let from = 0;
  while (from < total) {
    const fits = Math.floor((sheet.roomPt - 2 * PAD_Y_PT) / style.leadingPt);
    const take = Math.min(total - from, Math.max(1, fits));
    sheet.y += PAD_Y_PT;
    cells.forEach((cell, index) => {
      const element = elements[index];
      const lines = cell.lines.slice(from, from + take);
      if (!element || lines.length === 0) return;
      sheet.mark(element, tag, () => drawCell(sheet, { ...cell, lines }, style));
      for (const line of lines) sheet.takeFootnotes(line.footnotes);
    });
    sheet.y += take * style.leadingPt + PAD_Y_PT;
    from += take;
    if (from < total) continueOnNextPage(table);
  }
}

function drawCell(sheet: Sheet, cell: Cell, style: BlockStyle): void {
  cell.lines.forEach((line, index) => {
    const spare = cell.column.width - line.widthPt;
    const shift = cell.align === "right" ? spare : cell.align === "center" ? spare / 2 : 0;
    const y = sheet.y + index * style.leadingPt + baseline(style);
    sheet.type.draw(line, cell.column.x + Math.max(0, shift), y);
  });
}

/** Repeats the head for the eye; readers of the tags have it once. */
function continueOnNextPage(table: Table): void {
  const { sheet } = table;
  sheet.newPage();
  if (table.head.length === 0) return;
  rule(table, INK, 1.1);
  for (const row of table.head) {
    const top = sheet.y;
    sheet.y += PAD_Y_PT;
    sheet.artifact(() => {
      for (const cell of row) drawCell(sheet, cell, STYLES.tableHead);
    });
    sheet.y = top + rowHeightPt(row, STYLES.tableHead);
  }
  rule(table, INK, 0.75);
}

function captionLines(table: Table): Line[] {
  const { number, caption = [] } = table.block;
  const lead = number === undefined ? "" : `Table ${number}. `;
  if (lead === "" && caption.length === 0) return [];
  const runs = table.sheet.withFootnoteMarks([{ text: lead }, ...caption]);
  return table.sheet.type.lines(runs, STYLES.tableCaption, table.whole.width);
}

function caption(table: Table, element: StructureElement): void {
  const lines = captionLines(table);
  if (lines.length === 0) return;
  const { sheet, whole } = table;
  const captionElement = sheet.element(element, "Caption");
  sheet.flow(lines, STYLES.tableCaption, whole, captionElement, "Caption");
  sheet.y += 3;
}

function note(runs: readonly Run[], table: Table, parent: StructureElement): void {
  const { sheet, whole } = table;
  const lines = sheet.type.lines(sheet.withFootnoteMarks(runs), STYLES.small, whole.width);
  sheet.flow(lines, STYLES.small, whole, sheet.element(parent, "P"), "P");
}

function rule(table: Table, colour: string, widthPt: number): void {
  const { sheet, whole } = table;
  sheet.artifact(() => {
    sheet.doc.lineWidth(widthPt).strokeColor(colour);
    sheet.doc
      .moveTo(whole.x, sheet.y)
      .lineTo(whole.x + whole.width, sheet.y)
      .stroke();
  });
}
