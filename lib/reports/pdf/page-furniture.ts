import "server-only";
import { shortFingerprint } from "./fingerprint";
import type { ReportModel, Run } from "./model";
import { BLUE, INK, MARGIN_PT, MEASURE_PT, PAGE, RULE } from "./page-geometry";
import type { Sheet } from "./sheet";
import { STYLES, type BlockStyle } from "./styles";

const HEAD_RULE_PT = 70.5;
const FOOT_RULE_PT = 797;
const RIGHT_PT = PAGE.width - MARGIN_PT;

const MARK_LINES =
  "M2 3.5C9 3.5 12.5 9.2 16.2 12.2M2 8.7c5.2 0 8.6 2.4 14.2 3.5M2 14h19M2 19.3c6 0 8.8-3 13-5.3" +
  "M2 24.5c7 0 9.6-4.6 13-8.2 1-1 1.8-1.7 3-2.3M16.2 12.2C18 13.3 19 14 21 14";

/** Running head and foot of every page, drawn last because only then are the pages counted. */
export function drawFurniture(sheet: Sheet, model: ReportModel): void {
  for (let page = 1; page <= sheet.pageCount; page++) {
    sheet.onPage(page, () => {
      sheet.doc.markContent("Artifact", { type: "Pagination" });
      drawHead(sheet, model);
      drawFoot(sheet, model, page);
      sheet.doc.endMarkedContent();
    });
  }
}

function drawHead(sheet: Sheet, model: ReportModel): void {
  const { doc } = sheet;
  doc.save();
  doc.translate(MARGIN_PT, 39).scale(22.5 / 28);
  doc.lineWidth(1.35).lineCap("round").strokeColor(INK);
  doc.path(MARK_LINES).stroke();
  doc.circle(22.6, 14, 3.7).fill(BLUE);
  doc.restore();
  const { laboratoryName, addressLine } = model.letterhead;
  const textX = MARGIN_PT + 31.5;
  const width = MEASURE_PT - 31.5 - 130;
  at(sheet, [{ text: laboratoryName }], STYLES.laboratory, textX, 48.5, "left", width);
  at(sheet, [{ text: addressLine }], STYLES.furniture, textX, 60.5, "left", width);
  at(sheet, [{ text: model.caseNumber }], STYLES.caseNumber, RIGHT_PT, 51, "right", 126);
  if (model.draft) {
    at(sheet, [{ text: model.draft.label }], STYLES.furniture, RIGHT_PT, 62.5, "right", 126);
  }
  line(sheet, HEAD_RULE_PT, INK, 1.1);
}

function drawFoot(sheet: Sheet, model: ReportModel, page: number): void {
  line(sheet, FOOT_RULE_PT, RULE, 0.75);
  const y = FOOT_RULE_PT + 14;
  const style = STYLES.furniture;
  const state = model.draft ? model.draft.label : `issue ${model.issueNumber}`;
  const name: Run[] = [{ text: `${model.caseNumber}, ${state}`, mono: true }];
  at(sheet, name, style, MARGIN_PT, y, "left", MEASURE_PT * 0.45);
  if (model.fingerprint) {
    const mark = { text: shortFingerprint(model.fingerprint), mono: true };
    const middle = MARGIN_PT + MEASURE_PT * 0.55;
    at(sheet, [{ text: "Fingerprint " }, mark], style, middle, y, "middle", MEASURE_PT * 0.4);
  }
  at(sheet, [{ text: `Page ${page} of ${sheet.pageCount}` }], style, RIGHT_PT, y, "right", 90);
}

/** One line of text; what does not fit its width is left off rather than run into its neighbour. */
function at(
  sheet: Sheet,
  runs: Run[],
  style: BlockStyle,
  x: number,
  baselinePt: number,
  anchor: "left" | "middle" | "right",
  widthPt: number,
): void {
  const first = sheet.type.lines(runs, style, widthPt)[0];
  if (!first) return;
  const shift = { left: 0, middle: first.widthPt / 2, right: first.widthPt }[anchor];
  sheet.type.draw(first, x - shift, baselinePt);
}

function line(sheet: Sheet, y: number, colour: string, widthPt: number): void {
  sheet.doc.lineWidth(widthPt).strokeColor(colour);
  sheet.doc.moveTo(MARGIN_PT, y).lineTo(RIGHT_PT, y).stroke();
}
