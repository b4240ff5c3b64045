import "server-only";
import { drawBlocks, startHeightPt, type Setting } from "./draw-blocks";
import type { ReportModel, ReportSection } from "./model";
import type { PreparedImages } from "./prepare-image";
import { FULL_COLUMN, type Sheet } from "./sheet";
import { STYLES } from "./styles";

/** The proof: numbered sections, then what the report does not say, then its end. */
export function drawSections(sheet: Sheet, images: PreparedImages, model: ReportModel): void {
  for (const section of model.sections) drawSection(section, sheet, images);
  if (model.cautions.length > 0) {
    const items = model.cautions.map(({ text }) => [
      { kind: "paragraph" as const, runs: [{ text }] },
    ]);
    drawSection(
      {
        title: "Reach and limits of this report",
        blocks: [{ kind: "list", ordered: false, items }],
      },
      sheet,
      images,
    );
  }
  drawEnd(sheet, model);
}

function drawSection(section: ReportSection, sheet: Sheet, images: PreparedImages): void {
  const parent = sheet.element(sheet.root, "Sect");
  const setting: Setting = {
    sheet,
    images,
    parent,
    style: STYLES.text,
    column: () => FULL_COLUMN,
    headingTag: 3,
    afterPt: 7,
    onHeading: (level, text, topPt) => {
      // Two levels are enough to find one's way; deeper ones would only lengthen the list.
      if (level === 1) outline.addItem(text, { top: topPt - 10, left: FULL_COLUMN.x });
    },
  };
  const style = STYLES.section;
  const numberRuns = section.number ? [{ text: section.number }] : [];
  const number = sheet.type.lines(numberRuns, STYLES.sectionNumber, 80)[0];
  const indentPt = section.number && number ? number.widthPt + 10.5 : 0;
  const column = { x: FULL_COLUMN.x + indentPt, width: FULL_COLUMN.width - indentPt };
  const lines = sheet.type.lines([{ text: section.title }], style, column.width);
  sheet.space(13.5);
  sheet.need(lines.length * style.leadingPt + 6 + startHeightPt(section.blocks[0], setting));
  const title = section.number ? `${section.number} ${section.title}` : section.title;
  const outline = sheet.doc.outline.addItem(title, { top: sheet.y - 10, left: FULL_COLUMN.x });
  const element = sheet.element(parent, "H2");
  if (indentPt > 0 && number) {
    sheet.mark(element, "H2", () => {
      sheet.type.draw(number, FULL_COLUMN.x, sheet.y + style.leadingPt / 2 + style.sizePt * 0.34);
    });
  }
  sheet.flow(lines, style, column, element, "H2");
  sheet.y += 6;
  drawBlocks(section.blocks, setting);
}

function drawEnd(sheet: Sheet, model: ReportModel): void {
  const state = model.draft ? model.draft.label : `issue ${model.issueNumber}`;
  const runs = [{ text: `End of report ${model.caseNumber}, ${state}.`, bold: true }];
  const seal = model.fingerprint
    ? [
        { text: " Fingerprint of the frozen findings (SHA-256): " },
        { text: model.fingerprint, mono: true },
      ]
    : [];
  const lines = sheet.type.lines([...runs, ...seal], STYLES.small, FULL_COLUMN.width);
  sheet.space(10);
  sheet.need(lines.length * STYLES.small.leadingPt);
  sheet.flow(lines, STYLES.small, FULL_COLUMN, sheet.element(sheet.root, "P"), "P");
}
