import "server-only";

const NO_BREAK = "\u00A0";

// Marks that show nothing themselves but reorder, hide or join what stands around them.
const INVISIBLE = /[\u00AD\u061C\u200B-\u200F\u202A-\u202E\u2060-\u2069\uFE00-\uFE0F\uFEFF]/g;
const CONTROL = /[\u0000-\u0008\u000B-\u001F\u007F-\u009F\uFFF9-\uFFFB\uFFFE\uFFFF]/g;
const LONE_SURROGATE = /[\uD800-\uDBFF](?![\uDC00-\uDFFF])|(?<![\uD800-\uDBFF])[\uDC00-\uDFFF]/g;
const UNITS = "mm|µm|nm|m|kg|g|N|kN|J|MPa|GPa|Hz|kHz|h|s|min|r/min|°C|K|%|HV[\\d.]*|HRC|HRB|HBW";
const NUMBER_AND_UNIT = new RegExp(`(\\d) (?=(?:${UNITS})(?![\\p{L}\\d]))`, "gu");

/** What can be set in type: composed letters, no control or direction characters. */
export function cleanText(text: string): string {
  return text
    .replace(/\r\n?|[\u2028\u2029]/g, "\n")
    .replace(CONTROL, "")
    .replace(LONE_SURROGATE, "\uFFFD")
    .replace(INVISIBLE, "")
    .replace(/\t/g, " ")
    .normalize("NFC");
}

/** Ties a number to its uncertainty and its unit, so that a value never splits over lines. */
export function bindValues(text: string): string {
  return text
    .replace(/ ± /g, `${NO_BREAK}±${NO_BREAK}`)
    .replace(/([≈≤≥<>]) (?=[\d−])/g, `$1${NO_BREAK}`)
    .replace(NUMBER_AND_UNIT, `$1${NO_BREAK}`);
}

/** A whole value as one word. */
export function bindAll(text: string): string {
  return text.replace(/ /g, NO_BREAK);
}
