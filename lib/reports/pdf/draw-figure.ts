import "server-only";
import { drawChart } from "./draw-chart";
import type { ChartBlock, FigureBlock, Run } from "./model";
import { BODY_BOTTOM_PT, BODY_TOP_PT } from "./page-geometry";
import type { PreparedImages } from "./prepare-image";
import type { Column, Sheet, StructureElement } from "./sheet";
import { STYLES } from "./styles";

const ABOVE_PT = 8;
const CAPTION_GAP_PT = 5;
const BELOW_PT = 13;
/** Room that a figure leaves for its caption on a page of its own. */
const LEAST_CAPTION_PT = 60;
/** A chart is drawn so that its 12 px text is about as large as the caption. */
const CHART_BLEED_PT = 6;

type Extent = { width: number; height: number };

function extentOf(block: FigureBlock | ChartBlock, column: Column): Extent {
  const chart = block.kind === "chart";
  const widthPx = Math.max(1, chart ? block.chart.widthPx : block.widthPx);
  const heightPx = Math.max(1, chart ? block.chart.heightPx : block.heightPx);
  const mostHeight = (BODY_BOTTOM_PT - BODY_TOP_PT) * 0.6;
  // Small pictures are not blown up beyond 110 dots to the inch.
  const mostWidth = chart ? column.width : Math.min(column.width, (widthPx / 110) * 72);
  const scale = Math.min(mostWidth / widthPx, mostHeight / heightPx);
  return { width: widthPx * scale, height: heightPx * scale };
}

function captionLines(block: FigureBlock | ChartBlock, sheet: Sheet, column: Column) {
  return sheet.type.lines(captionRuns(block), STYLES.caption, column.width);
}

export function captionRuns(block: FigureBlock | ChartBlock): Run[] {
  if (block.number === undefined) return block.caption;
  return [{ text: `Figure ${block.number}. `, bold: true }, ...block.caption];
}

export function figureHeightPt(
  block: FigureBlock | ChartBlock,
  sheet: Sheet,
  column: Column,
): number {
  const lines = captionLines(block, sheet, column).length;
  const wholePt = ABOVE_PT + extentOf(block, column).height + CAPTION_GAP_PT;
  return wholePt + Math.min(lines * STYLES.caption.leadingPt, LEAST_CAPTION_PT);
}

export function drawFigureBlock(
  block: FigureBlock,
  sheet: Sheet,
  images: PreparedImages,
  parent: StructureElement,
  column: Column,
): void {
  sheet.need(figureHeightPt(block, sheet, column));
  sheet.space(ABOVE_PT);
  sheet.y += imageAt(block, sheet, images, parent, column, sheet.y);
  caption(block, sheet, parent, column);
}

/** Draws the picture alone and returns its height in points. */
export function imageAt(
  block: FigureBlock,
  sheet: Sheet,
  images: PreparedImages,
  parent: StructureElement,
  column: Column,
  y: number,
): number {
  const { width, height } = extentOf(block, column);
  const image = images.get(block);
  const bbox: [number, number, number, number] = [column.x, y, column.x + width, y + height];
  const element = sheet.element(parent, "Figure", { alt: block.alt, bbox });
  sheet.mark(element, "Figure", () => {
    if (image) sheet.doc.image(Buffer.from(image), column.x, y, { width, height });
  });
  return height;
}

export function drawChartBlock(
  block: ChartBlock,
  sheet: Sheet,
  parent: StructureElement,
  column: Column,
): void {
  sheet.need(figureHeightPt(block, sheet, column));
  sheet.space(ABOVE_PT);
  const { width, height } = extentOf(block, column);
  const x = column.x - CHART_BLEED_PT;
  const element = sheet.element(parent, "Figure", {
    alt: `${block.chart.title}. ${block.chart.description}`,
    bbox: [x, sheet.y, x + width, sheet.y + height],
  });
  sheet.mark(element, "Figure", () => {
    const scale = width / Math.max(1, block.chart.widthPx);
    drawChart(sheet.doc, sheet.type, block.chart, { x, y: sheet.y, scale });
  });
  sheet.y += height;
  caption(block, sheet, parent, column);
}

function caption(
  block: FigureBlock | ChartBlock,
  sheet: Sheet,
  parent: StructureElement,
  column: Column,
): void {
  sheet.y += CAPTION_GAP_PT;
  const runs = sheet.withFootnoteMarks(captionRuns(block));
  const lines = sheet.type.lines(runs, STYLES.caption, column.width);
  sheet.flow(lines, STYLES.caption, column, sheet.element(parent, "Caption"), "Caption");
  sheet.y += BELOW_PT;
}
