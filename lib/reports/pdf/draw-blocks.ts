import "server-only";
import { drawChartBlock, drawFigureBlock, figureHeightPt } from "./draw-figure";
import { drawTable, tableStartPt } from "./draw-table";
import type { Block, Run } from "./model";
import { BLUE, RULE } from "./page-geometry";
import type { PreparedImages } from "./prepare-image";
import { baseline, type Column, type Sheet, type StructureElement } from "./sheet";
import { STYLES, type BlockStyle } from "./styles";

/** Where blocks are set. `column` is asked anew for every block, as room beside a figure changes. */
export type Setting = {
  sheet: Sheet;
  images: PreparedImages;
  parent: StructureElement;
  style: BlockStyle;
  column: () => Column;
  /** Tag level of the report's own first heading level inside a section. */
  headingTag: number;
  afterPt: number;
  onHeading?: (level: 1 | 2 | 3, text: string, topPt: number) => void;
};

const LIST_INDENT_PT = 16;
const DEEPEST_LIST = 6;

export function drawBlocks(blocks: readonly Block[], setting: Setting, depth = 0): void {
  blocks.forEach((block, index) => drawBlock(block, blocks[index + 1], setting, depth));
}

function drawBlock(block: Block, next: Block | undefined, setting: Setting, depth: number): void {
  const { sheet } = setting;
  switch (block.kind) {
    case "paragraph":
      paragraph(block.runs, setting, setting.style, "P");
      return;
    case "heading":
      heading(block, next, setting);
      return;
    case "list":
      list(block, setting, depth);
      return;
    case "quote":
      framed(block.blocks, setting, RULE, depth);
      return;
    case "callout": {
      const title: Block[] = block.title
        ? [{ kind: "paragraph", runs: [{ text: block.title, bold: true }] }]
        : [];
      framed([...title, ...block.blocks], setting, BLUE, depth);
      return;
    }
    case "code":
      paragraph([{ text: keepIndents(block.text), mono: true }], setting, STYLES.code, "Code");
      return;
    case "rule":
      horizontalRule(setting);
      return;
    case "table":
      drawTable(block, sheet, setting.parent, setting.column());
      return;
    case "figure":
      drawFigureBlock(block, sheet, setting.images, setting.parent, setting.column());
      return;
    case "chart":
      drawChartBlock(block, sheet, setting.parent, setting.column());
      return;
  }
}

function keepIndents(text: string): string {
  return text.replace(/^[ \t]+/gm, (indent) => "\u00A0".repeat(indent.length));
}

/** Least height that a block needs to begin on a page, so that what introduces it stays with it. */
export function startHeightPt(block: Block | undefined, setting: Setting): number {
  if (!block) return 0;
  const { sheet, style } = setting;
  if (block.kind === "figure" || block.kind === "chart") {
    return figureHeightPt(block, sheet, setting.column());
  }
  if (block.kind === "table") return tableStartPt(block, sheet, setting.column());
  if (block.kind === "heading") return STYLES.heading1.leadingPt + 2 * style.leadingPt;
  return 2 * style.leadingPt;
}

export function paragraph(
  runs: readonly Run[],
  setting: Setting,
  style: BlockStyle,
  tag: string,
): void {
  const { sheet, parent } = setting;
  const column = setting.column();
  const lines = sheet.type.lines(sheet.withFootnoteMarks(runs), style, column.width);
  const element = sheet.element(parent, tag);
  sheet.flow(lines, style, column, element, tag);
  sheet.y += setting.afterPt;
}

function heading(
  block: Extract<Block, { kind: "heading" }>,
  next: Block | undefined,
  setting: Setting,
): void {
  const { sheet, parent } = setting;
  const style = [STYLES.heading1, STYLES.heading2, STYLES.heading3][block.level - 1];
  if (!style) return;
  const column = setting.column();
  const lines = sheet.type.lines(sheet.withFootnoteMarks(block.runs), style, column.width);
  sheet.space(6);
  sheet.need(lines.length * style.leadingPt + 4 + startHeightPt(next, setting));
  const text = block.runs.map((run) => run.text).join("");
  setting.onHeading?.(block.level, text, sheet.y);
  const tag = `H${Math.min(6, setting.headingTag + block.level - 1)}`;
  sheet.flow(lines, style, column, sheet.element(parent, tag), tag);
  sheet.y += 4;
}

function list(block: Extract<Block, { kind: "list" }>, setting: Setting, depth: number): void {
  const { sheet, style } = setting;
  const element = sheet.element(setting.parent, "L");
  // Deeper levels are kept but set no further in, or the column would run out.
  const indentPt = depth < DEEPEST_LIST ? LIST_INDENT_PT : 0;
  block.items.forEach((blocks, index) => {
    sheet.need(startHeightPt(blocks[0], setting));
    if (sheet.roomPt < style.leadingPt) sheet.newPage();
    const item = sheet.element(element, "LI");
    const label = block.ordered ? `${(block.start ?? 1) + index}.` : "•";
    const column = setting.column();
    const line = sheet.type.lines([{ text: label }], style, Number.MAX_SAFE_INTEGER)[0];
    sheet.mark(sheet.element(item, "Lbl"), "Lbl", () => {
      if (!line) return;
      const labelX = block.ordered ? LIST_INDENT_PT - 4 - line.widthPt : 4;
      sheet.type.draw(line, column.x + (indentPt ? labelX : 0), sheet.y + baseline(style));
    });
    const outer = setting.column;
    drawBlocks(
      blocks.length > 0 ? blocks : [{ kind: "paragraph", runs: [] }],
      {
        ...setting,
        parent: sheet.element(item, "LBody"),
        column: () => indented(outer(), LIST_INDENT_PT * (indentPt ? 1 : 0.9)),
        afterPt: 2.2,
      },
      depth + 1,
    );
  });
  sheet.y += Math.max(0, setting.afterPt - 2.2);
}

function indented(column: Column, byPt: number): Column {
  const by = Math.min(byPt, Math.max(0, column.width - 60));
  return { x: column.x + by, width: column.width - by };
}

/** Blocks with a bar at their left: quotations and call-outs. */
function framed(blocks: readonly Block[], setting: Setting, colour: string, depth: number): void {
  const { sheet } = setting;
  const outer = setting.column;
  const element = sheet.element(setting.parent, colour === RULE ? "BlockQuote" : "Div");
  sheet.need(startHeightPt(blocks[0], setting));
  withSideBar(sheet, outer().x, colour, () => {
    const column = () => indented(outer(), 13.5);
    drawBlocks(blocks, { ...setting, parent: element, column }, depth);
  });
}

/** Runs `draw`, then rules a bar along the height it took on every page it touched. */
export function withSideBar(sheet: Sheet, x: number, colour: string, draw: () => void): void {
  const first = { page: sheet.pageCount, y: sheet.y };
  draw();
  const last = sheet.pageCount;
  for (let page = first.page; page <= last; page++) {
    sheet.onPage(page, () => {
      const top = page === first.page ? first.y : sheet.topPt;
      const bottom = page === last ? sheet.y - 5 : sheet.bottomPt;
      if (bottom <= top) return;
      sheet.artifact(() => {
        sheet.doc.lineWidth(2.25).strokeColor(colour);
        sheet.doc
          .moveTo(x + 1.1, top)
          .lineTo(x + 1.1, bottom)
          .stroke();
      });
    });
  }
}

function horizontalRule(setting: Setting): void {
  const { sheet } = setting;
  sheet.need(14);
  const { x, width } = setting.column();
  sheet.artifact(() => {
    sheet.doc.lineWidth(0.75).strokeColor(RULE);
    sheet.doc
      .moveTo(x, sheet.y + 4)
      .lineTo(x + width, sheet.y + 4)
      .stroke();
  });
  sheet.y += 14;
}
