import { orderOfMagnitude, roundHalfEven, roundSignificant } from "@/lib/numerics/rounding";
import { DASH, GROUP_SPACE, MINUS, NO_BREAK_SPACE } from "@/lib/format/marks";

export type MaybeNumber = number | null | undefined;

export interface NumberShape {
  /** Places after the point; negative rounds to tens, hundreds. */
  decimals?: number;
  /** Significant figures; decimals wins where both are given. */
  figures?: number;
}

function isNumber(value: MaybeNumber): value is number {
  return value !== null && value !== undefined && Number.isFinite(value);
}

/** Thin groups from five digits up: 11 400 but 1034. The minus is a real one. */
function dress(decimalText: string): string {
  const [whole = "", fraction] = decimalText.replace("-", "").split(".");
  const grouped = whole.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, GROUP_SPACE);
  const sign = decimalText.startsWith("-") ? MINUS : "";
  return fraction === undefined ? sign + grouped : `${sign}${grouped}.${fraction}`;
}

/** A number as people read it; a dash where there is none. Rounds half to even. */
export function formatNumber(value: MaybeNumber, { decimals, figures }: NumberShape = {}): string {
  if (!isNumber(value)) return DASH;
  if (decimals !== undefined) return dress(roundHalfEven(value, decimals) ?? DASH);
  if (figures !== undefined) return dress(roundSignificant(value, figures) ?? DASH);
  return dress(roundHalfEven(value, decimalsOf(value)) ?? DASH);
}

/** Places after the point in the shortest text of a number: 2 for 1.95, 0 for 17. */
export function decimalsOf(value: number): number {
  const [mantissa = "", exponent = "0"] = String(value).split("e");
  const written = mantissa.split(".")[1]?.length ?? 0;
  return Math.max(0, written - Number(exponent));
}

/**
 * Place to which an uncertainty is rounded: one figure, or two where the first is 1 or 2 or where it
 * is ten or more, and never more places than it was given with. Common practice: at most two figures.
 */
export function uncertaintyDecimals(uncertainty: number): number {
  const order = orderOfMagnitude(uncertainty);
  if (order === null) return 0;
  const first = Math.floor(Math.abs(uncertainty) / 10 ** order);
  const figures = first <= 2 || order >= 1 ? 2 : 1;
  return Math.min(figures - 1 - order, decimalsOf(uncertainty));
}

/** Number and unit on one line. No space before a degree sign; one before everything else. */
export function formatQuantity(value: MaybeNumber, unit: string, shape: NumberShape = {}): string {
  if (!isNumber(value)) return DASH;
  return formatNumber(value, shape) + unitText(unit);
}

/** A unit with the space that goes before it: "\u00a0mm", "\u00a0%", "°", and nothing for no unit. */
export function unitText(unit: string): string {
  if (unit === "" || unit === "°") return unit;
  return NO_BREAK_SPACE + unit.replaceAll(" ", NO_BREAK_SPACE);
}

/**
 * "1.95 ± 0.06 mm": the uncertainty to at most two figures, the value to the same place.
 * Without an uncertainty the value stands alone in the given shape.
 */
export function formatWithUncertainty(
  value: MaybeNumber,
  uncertainty: MaybeNumber,
  unit: string,
  shape: NumberShape = {},
): string {
  if (!isNumber(value)) return DASH;
  if (!isNumber(uncertainty) || uncertainty === 0) return formatQuantity(value, unit, shape);
  const decimals = uncertaintyDecimals(uncertainty);
  const parts = [formatNumber(value, { decimals }), "±", formatNumber(uncertainty, { decimals })];
  return parts.join(NO_BREAK_SPACE) + unitText(unit);
}

/** "900 to 1100 MPa", with an open end as "at least 900 MPa" or "at most 1100 MPa". */
export function formatRange(
  least: MaybeNumber,
  most: MaybeNumber,
  unit: string,
  shape: NumberShape = {},
): string {
  if (isNumber(least) && isNumber(most)) {
    const ends = [formatNumber(least, shape), "to", formatNumber(most, shape)];
    return ends.join(NO_BREAK_SPACE) + unitText(unit);
  }
  if (isNumber(least)) return `at${NO_BREAK_SPACE}least ${formatQuantity(least, unit, shape)}`;
  if (isNumber(most)) return `at${NO_BREAK_SPACE}most ${formatQuantity(most, unit, shape)}`;
  return DASH;
}

/** "1 item", "3 items"; the plural is given where an s is not enough. */
export function formatCount(count: number, one: string, many = `${one}s`): string {
  return `${formatNumber(count)}${NO_BREAK_SPACE}${count === 1 ? one : many}`;
}

const BYTE_UNITS = ["bytes", "kB", "MB", "GB", "TB"] as const;

/** Size of a file in powers of a thousand: "412 bytes", "1.4 GB", "61 MB". */
export function formatBytes(bytes: MaybeNumber): string {
  if (!isNumber(bytes) || bytes < 0) return DASH;
  let size = bytes;
  let step = 0;
  // 999.5 would round up to "1000 kB".
  while (size >= 999.5 && step < BYTE_UNITS.length - 1) {
    size /= 1000;
    step += 1;
  }
  const decimals = step > 0 && size < 9.95 ? 1 : 0;
  return formatQuantity(size, BYTE_UNITS[step] ?? "bytes", { decimals });
}
