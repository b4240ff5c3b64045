/**
 * Rounding on decimal text, half to even. Binary floating point cannot hold 0.435 or 0.205, so
 * rounding the number itself gives 0.43 and 0.21; its shortest decimal text rounds to 0.44 and 0.20.
 * Source of the rule: ASTM E29 rounding method (half to even).
 */

interface Decimal {
  readonly negative: boolean;
  /** All significant digits, without the point. */
  readonly digits: bigint;
  /** How many of the digits stand behind the point; may be negative. */
  readonly places: number;
}

const DECIMAL_TEXT = /^([+-]?)(\d*)(?:\.(\d*))?(?:[eE]([+-]?\d+))?$/;

function parseDecimal(text: string): Decimal | null {
  const match = DECIMAL_TEXT.exec(text.trim());
  if (!match) return null;
  const [, sign, whole = "", fraction = "", exponent = "0"] = match;
  if (whole === "" && fraction === "") return null;
  return {
    negative: sign === "-",
    digits: BigInt(whole + fraction),
    places: fraction.length - Number(exponent),
  };
}

function decimalText({ negative, digits, places }: Decimal): string {
  const padded = digits.toString().padStart(places + 1, "0");
  const cut = padded.length - places;
  const text = places > 0 ? `${padded.slice(0, cut)}.${padded.slice(cut)}` : padded;
  return negative && digits !== 0n ? `-${text}` : text;
}

/**
 * Rounds to a number of decimals (negative: tens, hundreds), half to even.
 * `null` when the value is not a finite decimal number.
 */
export function roundHalfEven(value: number | string, decimals: number): string | null {
  const decimal = parseDecimal(String(value));
  if (!decimal) return null;
  const drop = decimal.places - decimals;
  const shift = 10n ** BigInt(Math.abs(drop));
  let digits = drop <= 0 ? decimal.digits * shift : decimal.digits / shift;
  if (drop > 0) {
    const twiceRest = (decimal.digits % shift) * 2n;
    if (twiceRest > shift || (twiceRest === shift && digits % 2n === 1n)) digits += 1n;
  }
  if (decimals >= 0) return decimalText({ ...decimal, digits, places: decimals });
  return decimalText({ ...decimal, digits: digits * 10n ** BigInt(-decimals), places: 0 });
}

/** Position of the first significant digit: 2 for 463, 0 for 8.1, -2 for 0.035. Zero has none. */
export function orderOfMagnitude(value: number | string): number | null {
  const decimal = parseDecimal(String(value));
  if (!decimal || decimal.digits === 0n) return null;
  return decimal.digits.toString().length - 1 - decimal.places;
}

/** Rounds to a number of significant figures, half to even: 9.996 to three figures is "10.0". */
export function roundSignificant(value: number | string, figures: number): string | null {
  const order = orderOfMagnitude(value);
  if (order === null) return roundHalfEven(value, figures - 1);
  const rounded = roundHalfEven(value, figures - 1 - order);
  if (rounded === null) return null;
  const roundedOrder = orderOfMagnitude(rounded) ?? order;
  return roundedOrder === order ? rounded : roundHalfEven(value, figures - 1 - roundedOrder);
}
