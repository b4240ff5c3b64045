import "server-only";
import PDFDocument from "pdfkit";
import { FACE_NAMES, face } from "./faces";
import { Footnotes } from "./footnotes";
import type { Line } from "./lines";
import type { ReportModel, Run } from "./model";
import { BODY_BOTTOM_PT, BODY_TOP_PT, MARGIN_PT, MEASURE_PT, PAGE } from "./page-geometry";
import type { BlockStyle } from "./styles";
import { Typesetter } from "./typesetter";

export type StructureElement = ReturnType<PDFKit.PDFDocument["struct"]>;
export type Column = { x: number; width: number };

export const FULL_COLUMN: Column = { x: MARGIN_PT, width: MEASURE_PT };

/** The document under way: where the next line goes and what each page still owes its foot. */
export class Sheet {
  readonly doc: PDFKit.PDFDocument;
  readonly root: StructureElement;
  readonly type: Typesetter;
  y = BODY_TOP_PT;
  pageCount = 0;
  private readonly footnotes: Footnotes;

  constructor(model: ReportModel) {
    this.doc = new PDFDocument({
      size: [PAGE.width, PAGE.height],
      margin: 0,
      autoFirstPage: false,
      bufferPages: true,
      pdfVersion: "1.7",
      tagged: true,
      lang: "en",
      displayTitle: true,
      // Without a starting face; left out, pdfkit starts with Helvetica.
      font: "",
      info: {
        Title: `${model.caseNumber}: ${model.title}`,
        Author: model.letterhead.laboratoryName,
        Subject: model.kicker,
        Creator: "Riverline",
        Producer: "Riverline",
        CreationDate: model.createdAt,
        ModDate: model.createdAt,
      },
    });
    for (const name of FACE_NAMES) this.doc.registerFont(name, face(name).file);
    this.type = new Typesetter(this.doc);
    this.root = this.doc.struct("Document");
    this.doc.addStructure(this.root);
    this.footnotes = new Footnotes(this.type);
    this.addPage();
  }

  /** Height left on this page above its footnotes. */
  get roomPt(): number {
    return BODY_BOTTOM_PT - this.footnotes.heightPt - this.y;
  }

  get atTop(): boolean {
    return this.y <= BODY_TOP_PT + 0.5;
  }

  readonly topPt = BODY_TOP_PT;
  readonly bottomPt = BODY_BOTTOM_PT;

  /** Draws on an earlier page (from 1) and comes back. */
  onPage(page: number, draw: () => void): void {
    this.doc.switchToPage(page - 1);
    draw();
    this.doc.switchToPage(this.pageCount - 1);
  }

  /** Ends the last page with its notes, and adds pages for notes that are still owed. */
  finish(): void {
    this.finishPage();
    while (this.footnotes.isOwing) this.newPage();
  }

  newPage(): void {
    this.finishPage();
    this.addPage();
  }

  /** Goes on to the next page unless `heightPt` fits here or a whole page would not hold it. */
  need(heightPt: number): void {
    if (heightPt > this.roomPt && !this.atTop) this.newPage();
  }

  space(heightPt: number): void {
    if (!this.atTop) this.y += heightPt;
  }

  private finishPage(): void {
    this.footnotes.drawAtFoot(this.doc, this.root);
  }

  /** Adds a child to the tag tree. */
  element(
    parent: StructureElement,
    tag: string,
    options: PDFKit.Mixins.StructureElementOptions = {},
  ): StructureElement {
    const element = this.doc.struct(tag, options);
    parent.add(element);
    return element;
  }

  /** Draws something that belongs to an element on the current page. */
  mark(element: StructureElement, tag: string, draw: () => void): void {
    const content = this.doc.markStructureContent(tag);
    draw();
    this.doc.endMarkedContent();
    element.add(content);
  }

  /** Draws what is not part of the text: rules, running heads, repeated table heads. */
  artifact(draw: () => void): void {
    this.doc.markContent("Artifact", { type: "Layout" });
    draw();
    this.doc.endMarkedContent();
  }

  /** Numbers the footnotes of runs and turns their marks into raised figures. */
  withFootnoteMarks(runs: readonly Run[]): Run[] {
    return runs.flatMap((run) => {
      if (!run.footnote) return [run];
      const { footnote, ...plain } = run;
      const number = this.footnotes.number(run, footnote);
      return [plain, { text: String(number), raised: "sup" as const, footnote: String(number) }];
    });
  }

  /**
   * Sets lines one under another, over as many pages as it takes. Never leaves one line of a
   * paragraph alone at the foot or at the head of a page.
   */
  flow(
    lines: readonly Line[],
    style: BlockStyle,
    column: Column,
    element: StructureElement,
    tag: string,
  ): void {
    let next = 0;
    while (next < lines.length) {
      const take = this.linesThatFit(lines, next, style);
      if (take === 0) {
        this.newPage();
        continue;
      }
      this.mark(element, tag, () => {
        for (const line of lines.slice(next, next + take)) this.line(line, style, column);
      });
      next += take;
      if (next < lines.length) this.newPage();
    }
  }

  footnoteCostPt(marks: readonly string[]): number {
    return this.footnotes.costPt(marks);
  }

  takeFootnotes(marks: readonly string[]): void {
    for (const mark of marks) this.footnotes.take(mark);
  }

  private line(line: Line, style: BlockStyle, column: Column): void {
    this.type.draw(line, column.x, this.y + baseline(style));
    this.y += style.leadingPt;
    this.takeFootnotes(line.footnotes);
  }

  private linesThatFit(lines: readonly Line[], from: number, style: BlockStyle): number {
    const left = lines.length - from;
    let fits = 0;
    let owedPt = 0;
    for (const line of lines.slice(from)) {
      owedPt += this.footnotes.costPt(line.footnotes);
      if ((fits + 1) * style.leadingPt + owedPt > this.roomPt) break;
      fits += 1;
    }
    if (fits >= left) return left;
    if (this.atTop) return Math.max(1, fits);
    if (left - fits === 1) fits -= 1;
    return fits < 2 ? 0 : fits;
  }

  private addPage(): void {
    this.doc.addPage();
    this.pageCount += 1;
    this.y = BODY_TOP_PT;
  }
}

/** Distance from the top of a line to its baseline, in points. */
export function baseline(style: BlockStyle): number {
  return style.leadingPt / 2 + style.sizePt * 0.34;
}
