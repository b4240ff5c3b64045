import { mean, sampleStandardDeviation } from "../numerics/statistics";
import { answer, refuse, type Answer, type Refusal } from "../numerics/verdict";
import { orderTraverse, type TraversePoint, type TraverseRefusalCode } from "./traverse-points";

/** How the end of decarburization was agreed; recorded with the depth. */
export type DecarburizationCriterion =
  | { readonly kind: "fraction_of_core"; readonly fraction: number }
  | { readonly kind: "offset_from_core"; readonly offsetHv: number }
  | { readonly kind: "plateau" };

/** Plateau band: mean of the plateau plus or minus the larger of 2 s and 10 HV. */
const BAND_DEVIATIONS = 2;
const LEAST_BAND_HV = 10;
const LEAST_PLATEAU_READINGS = 4;

export type DecarburizationRefusalCode =
  TraverseRefusalCode | "no_core_readings" | "too_few_plateau_readings";

export interface DecarburizationDepth {
  readonly depthMm: number;
  readonly coreHv: number;
  readonly coreReadings: number;
}

export type Decarburization =
  | Answer<DecarburizationDepth>
  /** No reading falls outside the criterion: no decarburization seen. */
  | { readonly verdict: "not_reached"; readonly coreHv: number }
  /** The deepest reading is still outside it. */
  | { readonly verdict: "beyond_last_reading"; readonly deepestMm: number; readonly coreHv: number }
  | Refusal<DecarburizationRefusalCode>;

/** Mean of the readings from the depth where the investigator sets the core. */
export function plateauHardness(
  points: readonly TraversePoint[],
  coreFromMm: number,
): { readonly coreHv: number; readonly values: readonly number[] } | Refusal<"no_core_readings"> {
  const values = points.filter(({ depthMm }) => depthMm >= coreFromMm).map((p) => p.hardness);
  return values.length > 0
    ? { coreHv: mean(values), values }
    : refuse("no_core_readings", "No reading lies at or beyond the depth where the core begins.");
}

/** Lowest and highest hardness that count as core. */
function coreBand(
  criterion: DecarburizationCriterion,
  coreHv: number,
  values: readonly number[],
): { readonly low: number; readonly high: number } {
  if (criterion.kind === "fraction_of_core")
    return { low: criterion.fraction * coreHv, high: Infinity };
  if (criterion.kind === "offset_from_core")
    return { low: coreHv - criterion.offsetHv, high: Infinity };
  const deviation = sampleStandardDeviation(values) ?? 0;
  const half = Math.max(BAND_DEVIATIONS * deviation, LEAST_BAND_HV);
  return { low: coreHv - half, high: coreHv + half };
}

/**
 * Depth of decarburization by hardness: between the last reading outside the criterion and the next
 * one, from which on all lie inside, straight line. It differs by design from the depth seen in the
 * structure. Source: ISO 3887, ASTM E1077 (the criterion is a choice; the plateau band is this
 * product's rule).
 */
export function decarburizationDepth(input: {
  readonly points: readonly TraversePoint[];
  readonly coreFromMm: number;
  readonly criterion: DecarburizationCriterion;
}): Decarburization {
  const ordered = orderTraverse(input.points);
  if (ordered.verdict === "refuse") return ordered;
  const { points } = ordered;
  const core = plateauHardness(points, input.coreFromMm);
  if ("verdict" in core) return core;
  const { coreHv, values } = core;
  if (input.criterion.kind === "plateau" && values.length < LEAST_PLATEAU_READINGS)
    return refuse(
      "too_few_plateau_readings",
      `The plateau needs ${LEAST_PLATEAU_READINGS} readings; there are ${values.length}.`,
    );
  const { low, high } = coreBand(input.criterion, coreHv, values);
  const lastOutside = points.findLastIndex(({ hardness }) => hardness < low || hardness > high);
  const outside = points[lastOutside];
  const inside = points[lastOutside + 1];
  if (!outside) return { verdict: "not_reached", coreHv };
  if (!inside) return { verdict: "beyond_last_reading", deepestMm: outside.depthMm, coreHv };
  const bound = outside.hardness < low ? low : high;
  const part = (bound - outside.hardness) / (inside.hardness - outside.hardness);
  const depthMm = outside.depthMm + part * (inside.depthMm - outside.depthMm);
  return answer({ depthMm, coreHv, coreReadings: values.length });
}
