import "server-only";
import type { ReportModel } from "./model";
import { RULE } from "./page-geometry";
import { FULL_COLUMN, baseline, type Column, type Sheet, type StructureElement } from "./sheet";
import { STYLES } from "./styles";

const PAD_PT = 3;
const LABEL_PT = 52;
const GAP_PT = 12;
const LEFT_SHARE = 0.56;

/** Label and value, two to a row, as a real table with row heads. */
export function drawFacts(
  facts: ReportModel["facts"],
  sheet: Sheet,
  parent: StructureElement,
): void {
  if (facts.length === 0) return;
  const table = sheet.element(parent, "Table");
  const leftPt = FULL_COLUMN.width * LEFT_SHARE;
  const columns: [Column, Column] = [
    { x: FULL_COLUMN.x, width: leftPt - GAP_PT },
    { x: FULL_COLUMN.x + leftPt, width: FULL_COLUMN.width - leftPt },
  ];
  ruleAt(sheet);
  for (let i = 0; i < facts.length; i += 2) {
    const row = sheet.element(table, "TR");
    const pair = facts
      .slice(i, i + 2)
      .map((fact, side) => layOut(fact, columns[side === 0 ? 0 : 1], sheet));
    const linesPt = Math.max(
      ...pair.map(({ value, label }) => Math.max(value.length, label.length)),
    );
    const heightPt = linesPt * STYLES.fact.leadingPt + 2 * PAD_PT;
    sheet.need(heightPt);
    const top = sheet.y + PAD_PT;
    for (const { label, value, column } of pair) {
      const head = sheet.element(row, "TH", { scope: "Row" });
      sheet.mark(head, "TH", () => drawLines(sheet, label, column.x, top));
      const cell = sheet.element(row, "TD");
      sheet.mark(cell, "TD", () => drawLines(sheet, value, column.x + LABEL_PT, top));
    }
    sheet.y += heightPt;
    ruleAt(sheet);
  }
  sheet.y += 13.5;
}

function layOut(fact: ReportModel["facts"][number], column: Column, sheet: Sheet) {
  return {
    column,
    label: sheet.type.lines([{ text: fact.label }], STYLES.factLabel, LABEL_PT - 4),
    value: sheet.type.lines([{ text: fact.text }], STYLES.fact, column.width - LABEL_PT),
  };
}

function drawLines(
  sheet: Sheet,
  lines: ReturnType<Sheet["type"]["lines"]>,
  x: number,
  top: number,
): void {
  lines.forEach((line, index) => {
    sheet.type.draw(line, x, top + index * STYLES.fact.leadingPt + baseline(STYLES.fact));
  });
}

function ruleAt(sheet: Sheet): void {
  sheet.artifact(() => {
    sheet.doc.lineWidth(0.75).strokeColor(RULE);
    sheet.doc
      .moveTo(FULL_COLUMN.x, sheet.y)
      .lineTo(FULL_COLUMN.x + FULL_COLUMN.width, sheet.y)
      .stroke();
  });
}
