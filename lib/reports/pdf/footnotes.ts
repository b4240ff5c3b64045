import "server-only";
import type { Line } from "./lines";
import type { Run } from "./model";
import { BODY_BOTTOM_PT, MARGIN_PT, MEASURE_PT, RULE } from "./page-geometry";
import { STYLES } from "./styles";
import type { Typesetter } from "./typesetter";

const GAP_PT = 10;
/** A page never gives more than this to its notes; a longer note is cut into the next page's. */
const MOST_PT = 220;

/** Notes owed to the foot of the current page, kept until the page is finished. */
export class Footnotes {
  private readonly texts: string[] = [];
  private readonly numbers = new WeakMap<Run, number>();
  private owed: Line[] = [];
  private carried: Line[] = [];

  constructor(private readonly type: Typesetter) {}

  get heightPt(): number {
    return this.owed.length === 0 ? 0 : GAP_PT + this.owed.length * STYLES.footnote.leadingPt;
  }

  /** The number of a run's note: the same one however often the run is measured. */
  number(run: Run, text: string): number {
    const known = this.numbers.get(run);
    if (known !== undefined) return known;
    this.texts.push(text);
    this.numbers.set(run, this.texts.length);
    return this.texts.length;
  }

  /** What the page would give up for these marks, beyond what it owes already. */
  costPt(marks: readonly string[]): number {
    const lines = marks.reduce((sum, mark) => sum + this.linesOf(mark).length, 0);
    if (lines === 0) return 0;
    const wholePt = lines * STYLES.footnote.leadingPt + (this.owed.length === 0 ? GAP_PT : 0);
    return Math.max(0, Math.min(wholePt, MOST_PT - this.heightPt));
  }

  take(mark: string): void {
    const room = Math.floor((MOST_PT - GAP_PT) / STYLES.footnote.leadingPt) - this.owed.length;
    const lines = this.linesOf(mark);
    this.owed.push(...lines.slice(0, Math.max(0, room)));
    this.carried.push(...lines.slice(Math.max(0, room)));
  }

  get isOwing(): boolean {
    return this.owed.length > 0;
  }

  drawAtFoot(doc: PDFKit.PDFDocument, root: ReturnType<PDFKit.PDFDocument["struct"]>): void {
    if (this.owed.length > 0) {
      const top = BODY_BOTTOM_PT - this.heightPt;
      doc.markContent("Artifact", { type: "Layout" });
      doc.lineWidth(0.5).strokeColor(RULE);
      doc
        .moveTo(MARGIN_PT, top + 5)
        .lineTo(MARGIN_PT + 110, top + 5)
        .stroke();
      doc.endMarkedContent();
      const note = doc.struct("Note");
      root.add(note);
      const content = doc.markStructureContent("Note");
      this.owed.forEach((line, index) => {
        const y = top + GAP_PT + (index + 0.75) * STYLES.footnote.leadingPt;
        this.type.draw(line, MARGIN_PT, y);
      });
      doc.endMarkedContent();
      note.add(content);
    }
    const most = Math.floor((MOST_PT - GAP_PT) / STYLES.footnote.leadingPt);
    this.owed = this.carried.slice(0, most);
    this.carried = this.carried.slice(most);
  }

  private linesOf(mark: string): Line[] {
    const runs = [{ text: `${mark}  ` }, { text: this.texts[Number(mark) - 1] ?? "" }];
    return this.type.lines(runs, STYLES.footnote, MEASURE_PT);
  }
}
