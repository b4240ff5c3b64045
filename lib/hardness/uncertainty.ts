import { studentTwoSided } from "../numerics/student-t";
import { mean, sampleStandardDeviation } from "../numerics/statistics";
import { isPositive, refuse, type Refusal } from "../numerics/verdict";
import { vickersDiagonalMm } from "./vickers";

/** Coverage factor for about 95 % (GUM). */
export const COVERAGE_FACTOR = 2;

/** One standard deviation either side (ISO 6507-1 annex on uncertainty). */
const ONE_SIGMA_PROBABILITY = 0.6827;

function rootSumOfSquares(parts: readonly number[]): number {
  return Math.sqrt(parts.reduce((sum, part) => sum + part ** 2, 0));
}

/** t for 68.27 % and n readings: 1.14 for five (ISO 6507-1 annex; from memory). */
export function oneSigmaFactor(n: number): number | Refusal<"too_few_values"> {
  return Number.isInteger(n) && n >= 2
    ? studentTwoSided(ONE_SIGMA_PROBABILITY, n - 1)
    : refuse("too_few_values", "Repeatability needs two readings or more.");
}

/** u_H = t s / sqrt(n): repeatability of a mean, in the unit of the readings. */
export function repeatabilityUncertainty(
  values: readonly number[],
): number | Refusal<"too_few_values"> {
  const factor = oneSigmaFactor(values.length);
  const deviation = sampleStandardDeviation(values);
  if (typeof factor !== "number" || deviation === null)
    return refuse("too_few_values", "Repeatability needs two readings or more.");
  return (factor * deviation) / Math.sqrt(values.length);
}

/** u_ms = (2 H / d) delta / (2 sqrt 3): resolution delta of the length measuring system. */
export function resolutionUncertainty(hv: number, forceN: number, resolutionMm: number): number {
  return ((2 * hv) / vickersDiagonalMm(hv, forceN)) * (resolutionMm / (2 * Math.sqrt(3)));
}

/** U = k sqrt(sum of squares); k = 2 unless given. */
export function expandedUncertainty(
  standardUncertainties: readonly number[],
  coverageFactor: number = COVERAGE_FACTOR,
): number {
  return coverageFactor * rootSumOfSquares(standardUncertainties);
}

/**
 * u(H) / H = sqrt((u_F / F)2 + (2 u_d / d)2), for Vickers and Knoop alike (both go with 1 / d2).
 * Half a micrometre on a 25 um diagonal is already 4 %.
 */
export function relativeReadingUncertainty(input: {
  /** Standard uncertainty of the mean diagonal, same unit as the diagonal. */
  readonly diagonalUncertainty: number;
  readonly diagonal: number;
  /** u_F / F as a fraction. */
  readonly relativeForceUncertainty?: number;
}): number | Refusal<"not_positive"> {
  const { diagonalUncertainty, diagonal, relativeForceUncertainty = 0 } = input;
  if (!isPositive(diagonal) || !(diagonalUncertainty >= 0) || !(relativeForceUncertainty >= 0))
    return refuse(
      "not_positive",
      "The diagonal has to be above zero, an uncertainty not below it.",
    );
  return rootSumOfSquares([relativeForceUncertainty, (2 * diagonalUncertainty) / diagonal]);
}

export interface MeanHardness {
  readonly mean: number;
  readonly n: number;
  /** `null` for a single reading. */
  readonly standardDeviation: number | null;
  /** k = 2, from repeatability and the reading of the diagonal; `null` when neither is known. */
  readonly expandedUncertainty: number | null;
}

/**
 * Mean of readings with its expanded uncertainty. The reading of the diagonal is taken as a shift
 * common to all readings, so that it does not shrink with their number.
 */
export function meanHardness(
  readings: readonly { readonly value: number; readonly standardUncertainty: number | null }[],
): MeanHardness | null {
  if (readings.length === 0) return null;
  const values = readings.map((reading) => reading.value);
  const known = readings.flatMap(({ standardUncertainty: u }) => (u === null ? [] : [u]));
  const repeatability = repeatabilityUncertainty(values);
  const parts = [
    ...(typeof repeatability === "number" ? [repeatability] : []),
    ...(known.length > 0 ? [mean(known)] : []),
  ];
  return {
    mean: mean(values),
    n: values.length,
    standardDeviation: sampleStandardDeviation(values),
    expandedUncertainty: parts.length > 0 ? expandedUncertainty(parts) : null,
  };
}
