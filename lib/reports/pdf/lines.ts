import "server-only";
import type { Span } from "./typeset";

/** A span on a line, `x` in points from the line's start. */
export type PlacedSpan = Span & { x: number; widthPt: number };
export type Line = { spans: PlacedSpan[]; widthPt: number; footnotes: string[] };

export type Measure = (span: Omit<Span, "footnote">) => number;

/** A word: what may not be broken, with the space that goes before it. */
type Word = { spans: Span[]; widthPt: number; space?: Span; spacePt: number; newLine: boolean };

// Long compounds may break after a hyphen between letters and after a slash, never inside a number.
const BREAK_INSIDE = /(?<=\p{L}-)(?=\p{L})|(?<=[/_—–])(?=[^/_\s\d])/u;

/** Breaks spans into lines no wider than `widthPt`; a word that is wider is broken anywhere. */
export function breakLines(spans: readonly Span[], widthPt: number, measure: Measure): Line[] {
  const lines: Line[] = [];
  let line: Line = { spans: [], widthPt: 0, footnotes: [] };
  const next = () => {
    lines.push(line);
    line = { spans: [], widthPt: 0, footnotes: [] };
  };
  for (const word of wordsOf(spans, measure)) {
    if (word.newLine) next();
    const spacePt = line.spans.length > 0 ? word.spacePt : 0;
    if (line.widthPt + spacePt + word.widthPt <= widthPt + 0.01) {
      if (spacePt > 0 && word.space) append(line, word.space, word.spacePt);
      for (const span of word.spans) append(line, span, measure(span));
      continue;
    }
    if (line.spans.length > 0) {
      // Without a space at the end of the line, copied or spoken text runs two words together.
      if (word.space) endWithSpace(line);
      next();
    }
    for (const span of word.widthPt > widthPt ? characters(word.spans) : word.spans) {
      const spanPt = measure(span);
      if (line.spans.length > 0 && line.widthPt + spanPt > widthPt + 0.01) next();
      append(line, span, spanPt);
    }
  }
  if (line.spans.length > 0 || lines.length === 0) next();
  return lines;
}

function append(line: Line, span: Span, widthPt: number): void {
  const last = line.spans.at(-1);
  if (last && !span.missing && !last.missing && sameStyle(last, span)) {
    last.text += span.text;
    last.widthPt += widthPt;
  } else {
    line.spans.push({ ...span, x: line.widthPt, widthPt });
  }
  line.widthPt += widthPt;
  if (span.footnote) line.footnotes.push(span.footnote);
}

function endWithSpace(line: Line): void {
  const last = line.spans.at(-1);
  if (last && !last.missing) last.text += " ";
}

function sameStyle(a: Span, b: Span): boolean {
  return (
    a.face === b.face &&
    a.sizePt === b.sizePt &&
    a.risePt === b.risePt &&
    a.colour === b.colour &&
    a.oblique === b.oblique &&
    a.underline === b.underline &&
    a.strike === b.strike &&
    a.tabular === b.tabular
  );
}

function wordsOf(spans: readonly Span[], measure: Measure): Word[] {
  const words: Word[] = [];
  let space: Span | undefined;
  let newLine = false;
  let joined = false;
  const add = (span: Span, starts: boolean) => {
    const widthPt = measure(span);
    const last = words.at(-1);
    if (last && joined && !starts) {
      last.spans.push(span);
      last.widthPt += widthPt;
    } else {
      const spacePt = space ? measure(space) : 0;
      words.push({ spans: [span], widthPt, ...(space && { space }), spacePt, newLine });
    }
    space = undefined;
    newLine = false;
    joined = true;
  };
  for (const span of spans) {
    if (span.missing) {
      add(span, false);
      continue;
    }
    const { footnote, ...plain } = span;
    const pieces = span.text.match(/\n| +|[^ \n]+/g) ?? [];
    pieces.forEach((piece, index) => {
      const note = footnote && index === pieces.length - 1 ? { footnote } : {};
      if (piece === "\n") {
        // An empty word keeps an empty line where two breaks follow each other.
        if (newLine) add({ ...plain, text: "" }, true);
        newLine = true;
        joined = false;
        space = undefined;
      } else if (piece.startsWith(" ")) {
        joined = false;
        space = newLine ? undefined : { ...plain, text: " " };
      } else {
        const parts = piece.split(BREAK_INSIDE);
        parts.forEach((part, k) => {
          add({ ...plain, text: part, ...(k === parts.length - 1 && note) }, k > 0);
        });
      }
    });
  }
  return words;
}

function characters(spans: readonly Span[]): Span[] {
  return spans.flatMap((span) => {
    if (span.missing) return [span];
    const { footnote, ...plain } = span;
    const signs = [...span.text];
    return signs.map((text, index) => ({
      ...plain,
      text,
      ...(footnote && index === signs.length - 1 && { footnote }),
    }));
  });
}
