import "server-only";
import { drawSections } from "./draw-sections";
import { drawFrontPage } from "./front-page";
import type { Block, FigureBlock, ReportModel, WrittenReport } from "./model";
import { drawFurniture } from "./page-furniture";
import { prepareImages } from "./prepare-image";
import { Sheet } from "./sheet";

/**
 * Writes a report as a tagged A4 PDF with every face embedded. The same model gives the same
 * bytes. Throws AppError INVALID when a picture cannot be read. Signs that no face has are shown
 * as a box and named in `warnings`.
 */
export async function writeReportPdf(model: ReportModel): Promise<WrittenReport> {
  const lead = model.leadFigure ? [model.leadFigure] : [];
  const blocks = [
    ...model.answer,
    ...model.summary.flatMap((part) => part.blocks),
    ...model.sections.flatMap((section) => section.blocks),
  ];
  const images = await prepareImages([...lead, ...figuresIn(blocks)]);
  const sheet = new Sheet(model);
  const bytes = collect(sheet.doc);
  drawFrontPage(sheet, images, model);
  if (model.sections.length > 0) sheet.newPage();
  drawSections(sheet, images, model);
  sheet.finish();
  drawFurniture(sheet, model);
  sheet.doc.end();
  return { pdf: await bytes, pageCount: sheet.pageCount, warnings: missingSigns(sheet) };
}

function figuresIn(blocks: readonly Block[]): FigureBlock[] {
  return blocks.flatMap((block): FigureBlock[] => {
    if (block.kind === "figure") return [block];
    if (block.kind === "list") return block.items.flatMap(figuresIn);
    if (block.kind === "quote" || block.kind === "callout") return figuresIn(block.blocks);
    return [];
  });
}

function collect(doc: PDFKit.PDFDocument): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const parts: Buffer[] = [];
    doc.on("data", (part: Buffer) => parts.push(part));
    doc.on("end", () => resolve(Buffer.concat(parts)));
    doc.on("error", reject);
  });
}

function missingSigns(sheet: Sheet): string[] {
  const signs = [...sheet.type.missing.keys()];
  if (signs.length === 0) return [];
  const shown = signs.slice(0, 12).map((sign) => {
    const code = (sign.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, "0");
    return `${sign} (U+${code})`;
  });
  const more = signs.length > shown.length ? ` and ${signs.length - shown.length} more` : "";
  return [
    `The report's type has no sign for ${shown.join(", ")}${more}. A box stands in its place. Write it in other signs, then make the report again.`,
  ];
}
