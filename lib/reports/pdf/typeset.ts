import "server-only";
import { bindAll, bindValues, cleanText } from "./clean-text";
import { face, faceChain, type FaceName } from "./faces";
import type { Run } from "./model";

export type TextStyle = {
  family: "serif" | "sans" | "mono";
  weight: "regular" | "medium" | "semibold";
  italic?: boolean;
  sizePt: number;
  colour: string;
  /** Digits of equal width, for columns of numbers. */
  tabular?: boolean;
};

/** Text in one face, ready to measure and draw. `missing` holds a sign that no face has. */
export type Span = {
  text: string;
  face: FaceName;
  oblique: boolean;
  sizePt: number;
  risePt: number;
  colour: string;
  tabular: boolean;
  underline: boolean;
  strike: boolean;
  missing?: string;
  footnote?: string;
};

const RAISED_SIZE = 0.68;
const MONO_SIZE = 0.93;

/** Splits runs by style and by which face has each character; reports characters without one. */
export function spansOf(
  runs: readonly Run[],
  base: TextStyle,
  onMissing: (sign: string) => void,
): Span[] {
  return runs.flatMap((run) => {
    const clean = cleanText(run.text);
    const text = run.cited ? bindAll(clean) : bindValues(clean);
    const spans = spansByFace(text, spanStyle(run, base), onMissing);
    const last = spans.at(-1);
    if (run.footnote && last) last.footnote = run.footnote;
    return spans;
  });
}

function spanStyle(run: Run, base: TextStyle): Omit<Span, "text"> {
  const mono = run.mono || base.family === "mono";
  const bold = run.bold || base.weight === "semibold";
  const italic = Boolean(run.italic || base.italic);
  const sizePt = base.sizePt * (mono && base.family !== "mono" ? MONO_SIZE : 1);
  const name = mono ? "mono" : styledFace(base, bold, italic);
  return {
    face: name,
    oblique: italic && name !== "serif-italic",
    sizePt: run.raised ? sizePt * RAISED_SIZE : sizePt,
    risePt: run.raised === "sup" ? sizePt * 0.34 : run.raised === "sub" ? sizePt * -0.14 : 0,
    colour: base.colour,
    tabular: Boolean(base.tabular),
    underline: Boolean(run.underline),
    strike: Boolean(run.strike),
  };
}

function styledFace(base: TextStyle, bold: boolean, italic: boolean): FaceName {
  if (base.family === "serif") return bold ? "serif-semibold" : italic ? "serif-italic" : "serif";
  if (bold) return "sans-semibold";
  return base.weight === "medium" ? "sans-medium" : "sans";
}

function spansByFace(
  text: string,
  style: Omit<Span, "text">,
  onMissing: (sign: string) => void,
): Span[] {
  const chain = faceChain(style.face);
  const spans: Span[] = [];
  let current: Span | undefined;
  for (const original of text) {
    const codePoint = original.codePointAt(0) ?? 0;
    const sign = substitute(original, chain);
    const found = sign === "\n" ? style.face : chain.find((name) => covers(name, sign));
    if (!found) {
      onMissing(original);
      current = undefined;
      spans.push({ ...style, text: "", missing: String.fromCodePoint(codePoint) });
      continue;
    }
    if (current?.face === found) {
      current.text += sign;
    } else {
      // A slanted stand-in would look like another sign, so only the wanted face is slanted.
      current = {
        ...style,
        text: sign,
        face: found,
        oblique: style.oblique && found === style.face,
      };
      spans.push(current);
    }
  }
  return spans;
}

const SPACES = /[\u2000-\u200A\u202F\u205F\u3000]/;

/** Typographic spaces and hyphens that differ only in width or breaking have plain equals. */
function substitute(sign: string, chain: readonly FaceName[]): string {
  if (chain.some((name) => covers(name, sign))) return sign;
  if (SPACES.test(sign)) return "\u00A0";
  if (sign === "\u2010" || sign === "\u2011") return "-";
  return sign;
}

function covers(name: FaceName, sign: string): boolean {
  return face(name).coverage.has(sign.codePointAt(0) ?? 0);
}
