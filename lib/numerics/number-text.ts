import { roundHalfEven } from "./rounding";

const NO_BREAK_SPACE = "\u00a0";
const MINUS = "\u2212";

/** A number as a sentence shows it: fixed decimals, a real minus sign; a dash when there is none. */
export function numberText(value: number, decimals: number): string {
  const text = roundHalfEven(value, decimals);
  return text === null ? "\u2013" : text.replace("-", MINUS);
}

/** Number and unit that stay together on a line: "0.160 mm". */
export function quantityText(value: number, decimals: number, unit: string): string {
  return `${numberText(value, decimals)}${NO_BREAK_SPACE}${unit}`;
}
