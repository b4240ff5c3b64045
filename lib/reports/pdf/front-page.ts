import "server-only";
import { drawBlocks, paragraph, withSideBar, type Setting } from "./draw-blocks";
import { captionRuns, imageAt } from "./draw-figure";
import { drawFacts } from "./draw-facts";
import { drawSignatures, signaturesHeightPt } from "./draw-signatures";
import type { FigureBlock, ReportModel } from "./model";
import { BLUE } from "./page-geometry";
import type { PreparedImages } from "./prepare-image";
import { FULL_COLUMN, type Column, type Sheet } from "./sheet";
import { STYLES, type BlockStyle } from "./styles";

const FIGURE_WIDTH_PT = 160.5;
const FIGURE_GAP_PT = 21;

/** The page that answers: facts, answer, what it rests on, what to do, signatures. */
export function drawFrontPage(sheet: Sheet, images: PreparedImages, model: ReportModel): void {
  const parent = sheet.element(sheet.root, "Sect");
  const base: Setting = {
    sheet,
    images,
    parent,
    style: STYLES.text,
    column: () => FULL_COLUMN,
    headingTag: 3,
    afterPt: 7,
  };
  paragraph([{ text: model.kicker }], { ...base, afterPt: 2 }, STYLES.kicker, "P");
  paragraph([{ text: model.title }], { ...base, afterPt: 9 }, STYLES.title, "H1");
  drawFacts(model.facts, sheet, parent);
  drawAnswer(model, base);
  drawSummary(model, base);
  drawClose(model, base);
}

function drawAnswer(model: ReportModel, base: Setting): void {
  if (model.answer.length === 0) return;
  const column = { x: FULL_COLUMN.x + 15.75, width: FULL_COLUMN.width - 15.75 };
  const { sheet } = base;
  withSideBar(sheet, FULL_COLUMN.x, BLUE, () => {
    const setting = { ...base, style: STYLES.answer, column: () => column };
    sheet.y += 1.5;
    label("Answer", setting, STYLES.answerHead);
    drawBlocks(model.answer, setting);
  });
  sheet.y += 6;
}

function drawSummary(model: ReportModel, base: Setting): void {
  const { sheet } = base;
  const figure = model.leadFigure;
  const aside = figure ? drawLeadFigure(figure, base) : undefined;
  const narrow: Column = {
    x: FULL_COLUMN.x,
    width: FULL_COLUMN.width - FIGURE_WIDTH_PT - FIGURE_GAP_PT,
  };
  const column = () =>
    aside && sheet.pageCount === aside.page && sheet.y < aside.bottomPt ? narrow : FULL_COLUMN;
  for (const { title, blocks } of model.summary) {
    const setting = { ...base, column, afterPt: 6 };
    sheet.need(STYLES.heading2.leadingPt + 3 * STYLES.text.leadingPt);
    label(title, setting, STYLES.heading2);
    drawBlocks(blocks, setting);
    sheet.y += 3;
  }
  if (aside && sheet.pageCount === aside.page) sheet.y = Math.max(sheet.y, aside.bottomPt);
}

/** Sets the figure at the right, from the current height, and leaves that height as it was. */
function drawLeadFigure(figure: FigureBlock, base: Setting): { page: number; bottomPt: number } {
  const { sheet, images, parent } = base;
  const x = FULL_COLUMN.x + FULL_COLUMN.width - FIGURE_WIDTH_PT;
  const column = { x, width: FIGURE_WIDTH_PT };
  const lines = sheet.type.lines(captionRuns(figure), STYLES.caption, FIGURE_WIDTH_PT);
  const picturePt = (FIGURE_WIDTH_PT * figure.heightPx) / Math.max(1, figure.widthPx);
  const captionPt = lines.length * STYLES.caption.leadingPt;
  sheet.need(Math.min(picturePt, 400) + 5 + captionPt);
  const top = sheet.y;
  sheet.y += imageAt(figure, sheet, images, parent, column, top) + 5;
  const element = sheet.element(parent, "Caption");
  // A caption that would run past the page is cut to it: the figure stands in its section in full.
  const room = Math.max(1, Math.floor(sheet.roomPt / STYLES.caption.leadingPt));
  sheet.flow(lines.slice(0, room), STYLES.caption, column, element, "Caption");
  const bottomPt = sheet.y + 10;
  sheet.y = top;
  return { page: sheet.pageCount, bottomPt };
}

/** Cautions of the first page and the signatures stand at its foot while there is room. */
function drawClose(model: ReportModel, base: Setting): void {
  const { sheet } = base;
  const cautions = model.cautions.filter((caution) => caution.onFirstPage);
  const runs = cautions.map(({ text }) => ({ text: `${text} ` }));
  const lines = runs.length ? sheet.type.lines(runs, STYLES.small, FULL_COLUMN.width) : [];
  const cautionPt = lines.length ? lines.length * STYLES.small.leadingPt + 12 : 0;
  const signaturePt = signaturesHeightPt(model.signatures, sheet);
  sheet.need(cautionPt + signaturePt);
  sheet.y = Math.max(
    sheet.y,
    sheet.bottomPt - (sheet.bottomPt - sheet.y - sheet.roomPt) - cautionPt - signaturePt,
  );
  if (lines.length > 0) {
    sheet.flow(lines, STYLES.small, FULL_COLUMN, sheet.element(base.parent, "P"), "P");
    sheet.y += 12;
  }
  drawSignatures(model.signatures, sheet, base.parent);
}

function label(text: string, setting: Setting, style: BlockStyle): void {
  paragraph([{ text }], { ...setting, afterPt: 3 }, style, "H2");
}
