export type OneNumber = { ok: true; value: number } | { ok: false; says: string };

const SPACES = /[\u00a0\u2009\u202f]/g;
const GROUPED = /^[+-]?\d{1,3}( \d{3})+([.,]\d+)?$/;
const PLAIN = /^[+-]?(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d+)?$/i;
/** "11,400" is eleven thousand to some and eleven to others. */
const TWO_READINGS = /^[+-]?[1-9]\d{0,2},\d{3}$/;
const QUOTE_MAX = 40;

/** What was typed, in quotes and not too long to read. */
export function quoted(typed: string): string {
  const shown = typed.trim();
  return `“${shown.length > QUOTE_MAX ? `${shown.slice(0, QUOTE_MAX)}…` : shown}”`;
}

/**
 * The one number in a typed text. Decimal comma and point are taken, thousands parted by spaces,
 * and the field's own unit after it. Two numbers, words or a comma with two readings are refused.
 */
export function oneNumber(typed: string, unit = ""): OneNumber {
  const refused: OneNumber = {
    ok: false,
    says: `This needs one number. You typed ${quoted(typed)}.`,
  };
  let text = typed.replace(SPACES, " ").replace("\u2212", "-").trim();
  if (unit !== "" && text.endsWith(unit)) text = text.slice(0, -unit.length).trim();
  if (GROUPED.test(text)) text = text.replaceAll(" ", "");
  else if (TWO_READINGS.test(text)) {
    const [whole = "", rest = ""] = text.split(",");
    return {
      ok: false,
      says: `${quoted(typed)} can be read in two ways. Type ${whole} ${rest} or ${whole}.${rest}.`,
    };
  }
  if (!PLAIN.test(text)) return refused;
  const value = Number(text.replace(",", "."));
  return Number.isFinite(value) ? { ok: true, value } : refused;
}
