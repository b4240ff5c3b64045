import { roundHalfEven } from "../numerics/rounding";
import { refuse, type Refusal } from "../numerics/verdict";

/** Carburized: effective case to 50 HRC. Source: SAE J423 (public summary). */
export const CARBURIZED_EFFECTIVE_CASE_HRC = 50;

/** Flame and induction, by carbon content in hundredths of a per cent. Source: SAE J423 (from memory). */
const BY_CARBON = [
  { from: 28, to: 32, hrc: 35 },
  { from: 33, to: 42, hrc: 40 },
  { from: 43, to: 52, hrc: 45 },
  { from: 53, to: Infinity, hrc: 50 },
] as const;

/**
 * Hardness that ends the effective case of a flame or induction hardened part. Carbon is decimal text,
 * rounded to 0.01 % half to even before the look-up; below 0.28 % the table says nothing.
 */
export function effectiveCaseHrc(carbonPercent: string): number | Refusal<"below_table"> {
  const hundredths = Number(roundHalfEven(carbonPercent, 2)) * 100;
  const row = BY_CARBON.find(
    ({ from, to }) => Math.round(hundredths) >= from && Math.round(hundredths) <= to,
  );
  return row
    ? row.hrc
    : refuse("below_table", "The table begins at 0.28\u00a0% carbon; below it there is no value.");
}
