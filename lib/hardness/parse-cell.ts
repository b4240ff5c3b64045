/** What is wrong with one pasted cell, in words for the person who pasted it. */
export type CellProblemCode =
  | "missing"
  | "words"
  | "not_a_number"
  | "two_numbers"
  | "unclear_number"
  | "not_positive"
  | "negative_depth"
  | "duplicate_depth";

export interface CellProblem {
  readonly code: CellProblemCode;
  readonly text: string;
}

export type ParsedCell =
  { readonly value: number; readonly hadDecimalComma: boolean } | { readonly problem: CellProblem };

const NUMBER = /^[+-]?(\d+[.,]?\d*|[.,]\d+)(e[+-]?\d+)?$/i;
const TWO_NUMBERS = /^[+-]?\d[\d.,]*[\s/|x×]+[+-]?\d[\d.,]*/i;
const NOT_A_NUMBER = /^[+-]?(nan|inf|infinity|∞|#\S+[!?]?)$/i;
/** Thin and no-break spaces between groups of three digits: 1 234,5 as typeset. */
const DIGIT_GROUPS = /(\d)[\u00a0\u2009\u202f](?=\d{3}(?!\d))/g;

const problem = (code: CellProblemCode, text: string): ParsedCell => ({ problem: { code, text } });

/** A cell that should hold one number; comma and point both mark decimals. */
export function parseNumberCell(cell: string): ParsedCell {
  const text = cell
    .trim()
    .replace(/\u2212/g, "-")
    .replace(DIGIT_GROUPS, "$1");
  if (text === "") return problem("missing", "The cell is empty.");
  if (NOT_A_NUMBER.test(text)) return problem("not_a_number", `“${text}” is not a number.`);
  if (NUMBER.test(text)) {
    const value = Number(text.replace(",", "."));
    return Number.isFinite(value)
      ? { value, hadDecimalComma: text.includes(",") }
      : problem("not_a_number", `“${text}” is too large.`);
  }
  if (TWO_NUMBERS.test(text)) return problem("two_numbers", `“${text}” holds two numbers.`);
  if (/^[+-]?[\d.,]+$/.test(text))
    return problem("unclear_number", `“${text}” has more than one decimal mark.`);
  return problem("words", `“${text}” is not a number.`);
}
