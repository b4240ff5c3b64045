import "server-only";
import type { ReportSignature } from "./model";
import { BLUE, INK } from "./page-geometry";
import { FULL_COLUMN, baseline, type Column, type Sheet, type StructureElement } from "./sheet";
import { STYLES, type BlockStyle } from "./styles";

const GAP_PT = 18;
const PER_ROW = 3;
const TOP_PT = 5;
const ROW_GAP_PT = 12;

type SetLine = { line: ReturnType<Sheet["type"]["lines"]>[number]; style: BlockStyle };

export function signaturesHeightPt(signatures: readonly ReportSignature[], sheet: Sheet): number {
  return rowsOf(signatures).reduce((pt, row) => pt + rowHeightPt(row, sheet) + ROW_GAP_PT, 0);
}

/** Each act with name, role, time and meaning; the one that decides stands wider, under a bar. */
export function drawSignatures(
  signatures: readonly ReportSignature[],
  sheet: Sheet,
  parent: StructureElement,
): void {
  for (const row of rowsOf(signatures)) {
    const heightPt = rowHeightPt(row, sheet);
    sheet.need(heightPt);
    const top = sheet.y;
    columnsOf(row).forEach((column, index) => {
      const signature = row[index];
      if (!signature) return;
      bar(sheet, column, top, Boolean(signature.decides));
      const element = sheet.element(parent, "P");
      sheet.mark(element, "P", () => {
        let y = top + TOP_PT;
        for (const { line, style } of setLines(signature, sheet, column)) {
          sheet.type.draw(line, column.x, y + baseline(style));
          y += style.leadingPt;
        }
      });
    });
    sheet.y = top + heightPt + ROW_GAP_PT;
  }
}

function rowsOf(signatures: readonly ReportSignature[]): ReportSignature[][] {
  const rows: ReportSignature[][] = [];
  for (let i = 0; i < signatures.length; i += PER_ROW) rows.push(signatures.slice(i, i + PER_ROW));
  return rows;
}

function columnsOf(row: readonly ReportSignature[]): Column[] {
  const shares = row.map((signature) => (signature.decides ? 1.5 : 1));
  // A short last row keeps the widths of a full one.
  const total = Math.max(
    shares.reduce((sum, share) => sum + share, 0),
    PER_ROW,
  );
  const room = FULL_COLUMN.width - GAP_PT * (Math.max(row.length, PER_ROW) - 1);
  let x = FULL_COLUMN.x;
  return shares.map((share) => {
    const width = (room * share) / total;
    const column = { x, width };
    x += width + GAP_PT;
    return column;
  });
}

function setLines(signature: ReportSignature, sheet: Sheet, column: Column): SetLine[] {
  const { act, name, role, at, meaning } = signature;
  const set = (text: string, style: BlockStyle): SetLine[] =>
    sheet.type.lines([{ text }], style, column.width).map((line) => ({ line, style }));
  return [
    ...set(act, STYLES.small),
    ...set(role ? `${name}, ${role}` : name, STYLES.signatory),
    ...set(at, STYLES.small),
    ...(meaning ? set(meaning, STYLES.small) : []),
  ];
}

function rowHeightPt(row: readonly ReportSignature[], sheet: Sheet): number {
  const columns = columnsOf(row);
  const heights = row.map((signature, index) => {
    const column = columns[index];
    if (!column) return 0;
    return setLines(signature, sheet, column).reduce((pt, { style }) => pt + style.leadingPt, 0);
  });
  return TOP_PT + Math.max(0, ...heights);
}

function bar(sheet: Sheet, column: Column, top: number, decides: boolean): void {
  sheet.artifact(() => {
    sheet.doc.lineWidth(decides ? 2.25 : 0.75).strokeColor(decides ? BLUE : INK);
    sheet.doc
      .moveTo(column.x, top)
      .lineTo(column.x + column.width, top)
      .stroke();
  });
}
