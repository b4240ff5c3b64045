import { mean } from "../numerics/statistics";
import { answer, refuse, type Answer, type Notice, type Refusal } from "../numerics/verdict";
import { orderTraverse, type TraversePoint, type TraverseRefusalCode } from "./traverse-points";

/** Where the curve falls from at-or-above the limit to below it, going inwards. */
export interface Crossing<Point extends TraversePoint = TraversePoint> {
  readonly depthMm: number;
  /** Last reading at or above the limit. */
  readonly above: Point;
  /** First reading below it. */
  readonly below: Point;
}

export type DepthWarningCode = "several_crossings" | "surface_below_limit" | "mixed_loads";

export interface FoundDepth<Point extends TraversePoint = TraversePoint> {
  readonly depthMm: number;
  readonly crossings: readonly Crossing<Point>[];
}

export type CaseDepth<Point extends TraversePoint = TraversePoint> =
  | Answer<FoundDepth<Point>, DepthWarningCode>
  /** No reading reaches the limit. The depth is not zero: it was not found. */
  | { readonly verdict: "not_reached" }
  /** The curve never falls below the limit: deeper than the deepest reading. */
  | { readonly verdict: "beyond_last_reading"; readonly deepestMm: number }
  | Refusal<TraverseRefusalCode | "no_limit">;

/** Straight line between two readings; they bracket the limit, so their hardness differs. */
export function interpolatedDepthMm(
  above: TraversePoint,
  below: TraversePoint,
  limit: number,
): number {
  const fall = above.hardness - below.hardness;
  return above.depthMm + ((below.depthMm - above.depthMm) * (above.hardness - limit)) / fall;
}

/** Every inward crossing of readings sorted by depth. */
export function inwardCrossings<Point extends TraversePoint>(
  sorted: readonly Point[],
  limit: number,
): readonly Crossing<Point>[] {
  return sorted.flatMap((below, index) => {
    const above = sorted[index - 1];
    if (!above || above.hardness < limit || below.hardness >= limit) return [];
    return [{ depthMm: interpolatedDepthMm(above, below, limit), above, below }];
  });
}

/**
 * Distance below the surface where the hardness falls to the limit, straight line between the last
 * reading at or above it and the first below. With several crossings the first is given and all are
 * named. Never a spline, never an extrapolation.
 * Source: ISO 18203 annex A, ISO 2639 (formula from memory; 550 HV limit read).
 */
export function caseDepth<Point extends TraversePoint>(input: {
  readonly points: readonly Point[];
  readonly limit: number;
  readonly isOneCurve?: boolean;
}): CaseDepth<Point> {
  const { limit } = input;
  if (!(Number.isFinite(limit) && limit > 0))
    return refuse("no_limit", "The limit hardness has to be above zero.");
  const ordered = orderTraverse(input.points, { isOneCurve: input.isOneCurve });
  if (ordered.verdict === "refuse") return ordered;
  const { points } = ordered;
  const shallowest = points[0];
  const deepest = points[points.length - 1];
  if (!shallowest || !deepest || points.every((point) => point.hardness < limit))
    return { verdict: "not_reached" };
  const crossings = inwardCrossings(points, limit);
  const [first] = crossings;
  if (!first) return { verdict: "beyond_last_reading", deepestMm: deepest.depthMm };

  const warnings: Notice<DepthWarningCode>[] = [...ordered.warnings];
  if (crossings.length > 1) {
    const last = crossings[crossings.length - 1] ?? first;
    warnings.push({
      code: "several_crossings",
      text: `The curve falls below the limit ${crossings.length} times; the first is given, the last lies at ${last.depthMm.toFixed(2)}\u00a0mm. Measure again.`,
    });
  }
  if (shallowest.hardness < limit)
    warnings.push({
      code: "surface_below_limit",
      text: "The reading next to the surface is below the limit: soft skin.",
    });
  return answer({ depthMm: first.depthMm, crossings }, warnings);
}

/** Two depths may lie this far apart at most, and each needs this many indents (ISO 18203 annex A). */
const LARGEST_TWO_DEPTH_STEP_MM = 0.3;
const LEAST_TWO_DEPTH_INDENTS = 5;

export interface IndentsAtDepth {
  readonly depthMm: number;
  readonly hardness: readonly number[];
}

/** Case depth from means of at least five indents at two depths. Source: ISO 18203 annex A (from memory). */
export function twoDepthCaseDepth(input: {
  readonly shallow: IndentsAtDepth;
  readonly deep: IndentsAtDepth;
  readonly limit: number;
}):
  | Answer<{ readonly depthMm: number }>
  | Refusal<"too_few_readings" | "depths_too_far_apart" | "limit_not_between" | "not_a_number"> {
  const { shallow, deep, limit } = input;
  if (Math.min(shallow.hardness.length, deep.hardness.length) < LEAST_TWO_DEPTH_INDENTS)
    return refuse("too_few_readings", "Each of the two depths needs five indents.");
  const step = deep.depthMm - shallow.depthMm;
  const numbers = [step, limit, shallow.depthMm, ...shallow.hardness, ...deep.hardness];
  if (!numbers.every((number) => Number.isFinite(number) && number > 0))
    return refuse("not_a_number", "Depths, hardness and limit have to be above zero, in order.");
  // The step is compared in micrometres: 1.1 - 0.8 is a hair above 0.3 in binary.
  if (Math.round(step * 1000) > LARGEST_TWO_DEPTH_STEP_MM * 1000)
    return refuse("depths_too_far_apart", "The two depths lie more than 0.3\u00a0mm apart.");
  const above = { depthMm: shallow.depthMm, hardness: mean(shallow.hardness) };
  const below = { depthMm: deep.depthMm, hardness: mean(deep.hardness) };
  if (above.hardness < limit || below.hardness >= limit)
    return refuse("limit_not_between", "The limit does not lie between the two means.");
  return answer({ depthMm: interpolatedDepthMm(above, below, limit) });
}
