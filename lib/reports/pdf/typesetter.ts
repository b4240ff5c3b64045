import "server-only";
import { breakLines, type Line, type PlacedSpan } from "./lines";
import type { Run } from "./model";
import type { BlockStyle } from "./styles";
import { spansOf, type Span } from "./typeset";

/** Sets runs in lines and draws lines, with one memory of widths and of signs that no face has. */
export class Typesetter {
  /** Sign to number of times it was asked for. */
  readonly missing = new Map<string, number>();
  private readonly widths = new Map<string, number>();

  constructor(private readonly doc: PDFKit.PDFDocument) {}

  lines(runs: readonly Run[], style: BlockStyle, widthPt: number): Line[] {
    return breakLines(this.spans(runs, style), widthPt, this.measure);
  }

  /** Widths of the widest unbreakable word and of the whole on one line, for table columns. */
  extent(runs: readonly Run[], style: BlockStyle): { wordPt: number; linePt: number } {
    const spans = this.spans(runs, style);
    const widest = (lines: Line[]) => Math.max(0, ...lines.map((line) => line.widthPt));
    return {
      wordPt: this.widestWord(spans),
      linePt: widest(breakLines(spans, Number.MAX_SAFE_INTEGER, this.measure)),
    };
  }

  /** Draws a line with its baseline at `baselinePt`. */
  draw(line: Line, xPt: number, baselinePt: number): void {
    for (const span of line.spans) this.drawSpan(span, xPt + span.x, baselinePt - span.risePt);
  }

  readonly measure = (span: Omit<Span, "footnote">): number => {
    if (span.missing) return span.sizePt * 0.62;
    if (span.text === "") return 0;
    const key = `${span.face}|${span.sizePt}|${span.tabular ? 1 : 0}|${span.text}`;
    const known = this.widths.get(key);
    if (known !== undefined) return known;
    this.doc.font(span.face).fontSize(span.sizePt);
    const widthPt = this.doc.widthOfString(span.text, featuresOf(span));
    this.widths.set(key, widthPt);
    return widthPt;
  };

  private spans(runs: readonly Run[], style: BlockStyle): Span[] {
    return spansOf(runs, style, (sign) => {
      this.missing.set(sign, (this.missing.get(sign) ?? 0) + 1);
    });
  }

  private widestWord(spans: readonly Span[]): number {
    let widest = 0;
    for (const span of spans) {
      for (const word of span.text.split(/[ \n]+/)) {
        widest = Math.max(widest, this.measure({ ...span, text: word }));
      }
    }
    return widest;
  }

  private drawSpan(span: PlacedSpan, x: number, y: number): void {
    const { doc } = this;
    if (span.missing) {
      this.drawBox(span, x, y);
      return;
    }
    if (span.text === "") return;
    doc.font(span.face).fontSize(span.sizePt).fillColor(span.colour);
    doc.text(span.text, x, y, {
      lineBreak: false,
      baseline: "alphabetic",
      ...featuresOf(span),
      ...(span.oblique && { oblique: 12 }),
    });
    if (span.underline) this.rule(span, x, y + span.sizePt * 0.14);
    if (span.strike) this.rule(span, x, y - span.sizePt * 0.28);
  }

  private rule(span: PlacedSpan, x: number, y: number): void {
    const { doc } = this;
    doc.lineWidth(span.sizePt / 18).strokeColor(span.colour);
    doc
      .moveTo(x, y)
      .lineTo(x + span.widthPt, y)
      .stroke();
  }

  /** A box where a sign cannot be set; the sign itself is kept for copying and reading aloud. */
  private drawBox(span: PlacedSpan, x: number, y: number): void {
    const { doc } = this;
    const size = span.sizePt * 0.5;
    doc.markContent("Span", { actual: span.missing ?? "" });
    doc.lineWidth(0.7).strokeColor(span.colour);
    doc.rect(x + span.sizePt * 0.06, y - size - 0.6, size, size + 0.6).stroke();
    doc.endMarkedContent();
  }
}

function featuresOf(span: Omit<Span, "footnote">): { features?: ["tnum"] } {
  return span.tabular ? { features: ["tnum"] } : {};
}
