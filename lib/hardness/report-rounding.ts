import { roundHalfEven, roundSignificant } from "../numerics/rounding";

export type ReportedScale = "HV" | "HK" | "HBW";

/** Decimals of a reported Vickers or Knoop value: none from 100, one from 10, two below. */
function vickersDecimals(value: number): number {
  if (value >= 100) return 0;
  return value >= 10 ? 1 : 2;
}

/**
 * The value as a report writes it, as decimal text (half to even); `null` when it is not finite.
 * HV and HK: integer from 100, one decimal from 10 to 100, two below, the class chosen by the
 * rounded value, so that 9.996 is "10.0" (ISO 6507-1, ISO 4545-1). HBW: three significant figures
 * (ISO 6506-1). From memory of the standards.
 */
export function reportedHardness(value: number, scale: ReportedScale): string | null {
  if (!Number.isFinite(value)) return null;
  if (scale === "HBW") return roundSignificant(value, 3);
  const first = roundHalfEven(value, vickersDecimals(value));
  return first === null ? null : roundHalfEven(value, vickersDecimals(Number(first)));
}

/** "464 HV10": a hardness is never written without its load. */
export function hardnessStatement(value: number, scale: ReportedScale, symbol: string): string {
  return `${reportedHardness(value, scale) ?? "\u2013"}\u00a0${symbol}`;
}

/** Strength out of a hardness table is good to some tens of MPa at best (common practice). */
const STRENGTH_STEP_MPA = 5;

/** A tensile strength estimated from hardness, MPa, to the five it is shown with. */
export function reportedStrengthMpa(strengthMpa: number): number {
  return Math.round(strengthMpa / STRENGTH_STEP_MPA) * STRENGTH_STEP_MPA;
}
