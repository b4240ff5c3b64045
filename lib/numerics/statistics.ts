import { studentTwoSided } from "./student-t";
import { answer, refuse, type Answer, type Refusal } from "./verdict";

/** Arithmetic mean of one value or more; NaN of none. */
export function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

/** Sample standard deviation, divisor n - 1; `null` below two values. */
export function sampleStandardDeviation(values: readonly number[]): number | null {
  if (values.length < 2) return null;
  const centre = mean(values);
  const squares = values.reduce((sum, value) => sum + (value - centre) ** 2, 0);
  return Math.sqrt(squares / (values.length - 1));
}

export interface Interval {
  readonly low: number;
  readonly high: number;
  readonly halfWidth: number;
}

/**
 * 95 % interval of the mean, t s / sqrt(n) with n - 1 degrees of freedom (GUM, Table G.2).
 * Refused below three values; below five it comes with the warning `wide`.
 */
export function meanInterval95(
  values: readonly number[],
): Answer<Interval, "wide"> | Refusal<"too_few_values"> {
  const n = values.length;
  const deviation = sampleStandardDeviation(values);
  if (deviation === null || n < 3) {
    return refuse("too_few_values", `An interval of the mean needs three values; there are ${n}.`);
  }
  const centre = mean(values);
  const halfWidth = (studentTwoSided(0.95, n - 1) * deviation) / Math.sqrt(n);
  const wide = { code: "wide", text: `From ${n} values the interval is wide.` } as const;
  return answer(
    { low: centre - halfWidth, high: centre + halfWidth, halfWidth },
    n < 5 ? [wide] : [],
  );
}

export interface SetStatistics {
  readonly n: number;
  readonly mean: number;
  /** `null` for a single value. */
  readonly standardDeviation: number | null;
  readonly range: number;
  /** Standard deviation over mean, as a fraction; `null` for a single value or a mean of zero. */
  readonly coefficientOfVariation: number | null;
  readonly interval95: ReturnType<typeof meanInterval95>;
}

/** Statistics of a set of readings; refused when it is empty or holds a value that is not finite. */
export function setStatistics(
  values: readonly number[],
): SetStatistics | Refusal<"no_values" | "not_finite"> {
  if (values.length === 0) return refuse("no_values", "There is no value to work with.");
  if (!values.every(Number.isFinite)) return refuse("not_finite", "A value is not a number.");
  const centre = mean(values);
  const deviation = sampleStandardDeviation(values);
  return {
    n: values.length,
    mean: centre,
    standardDeviation: deviation,
    range: values.reduce((a, b) => Math.max(a, b)) - values.reduce((a, b) => Math.min(a, b)),
    coefficientOfVariation: deviation === null || centre === 0 ? null : deviation / centre,
    interval95: meanInterval95(values),
  };
}
