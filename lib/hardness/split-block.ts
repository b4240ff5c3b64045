export type Separator = "tab" | "semicolon" | "comma" | "space";

export interface SplitLine {
  /** Place in the pasted text, from 1. */
  readonly line: number;
  readonly cells: readonly string[];
}

export type SplitBlock =
  | { readonly separator: Separator; readonly lines: readonly SplitLine[] }
  | { readonly refused: "unclear_commas"; readonly reason: string };

const unquote = (cell: string) =>
  cell
    .trim()
    .replace(/^"(.*)"$/s, "$1")
    .replaceAll('""', '"')
    .trim();

const SPLITTERS: Record<Separator, RegExp> = {
  tab: /\t/,
  semicolon: /;/,
  comma: /,/,
  space: / +/,
};

/** A comma that can only stand between columns: a space after it, or a decimal point elsewhere. */
function commasSeparate(lines: readonly string[]): boolean {
  const withComma = lines.filter((line) => line.includes(","));
  return withComma.some((line) => /,\s/.test(line) || /\d\.\d/.test(line));
}

function chooseSeparator(lines: readonly string[]): Separator | "unclear_commas" {
  if (lines.some((line) => line.includes("\t"))) return "tab";
  if (lines.some((line) => line.includes(";"))) return "semicolon";
  const hasCommas = lines.some((line) => line.includes(","));
  if (hasCommas && commasSeparate(lines)) return "comma";
  if (lines.some((line) => /[\d.,]\s+[\d.,]/.test(line.trim()))) return "space";
  // Commas alone: one a line stands between two whole numbers; with more, either reading fits.
  if (lines.some((line) => /\d,.*\d,/.test(line))) return "unclear_commas";
  return hasCommas ? "comma" : "space";
}

/**
 * Lines and cells of a pasted block. The separator is chosen for the block as a whole, in this
 * order: tab, semicolon, comma (when a space follows it or points mark the decimals), spaces. A block
 * with commas alone, two or more to a line, is refused rather than guessed.
 */
export function splitBlock(text: string): SplitBlock {
  const lines = text
    .split(/\r\n|\r|\n/)
    .map((content, index) => ({ line: index + 1, content }))
    .filter(({ content }) => content.trim() !== "");
  const separator = chooseSeparator(lines.map(({ content }) => content));
  if (separator === "unclear_commas")
    return {
      refused: "unclear_commas",
      reason:
        "The commas could stand between columns or mark decimals. Put tabs or semicolons between the columns and paste again.",
    };
  return {
    separator,
    lines: lines.map(({ line, content }) => ({
      line,
      cells: (separator === "space" ? content.trim() : content)
        .split(SPLITTERS[separator])
        .map(unquote),
    })),
  };
}
