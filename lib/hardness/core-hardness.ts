import { lastAtOrBelow } from "../numerics/bisect";
import { mean } from "../numerics/statistics";
import { answer, refuse, type Answer, type Refusal } from "../numerics/verdict";
import { inwardCrossings } from "./case-depth";
import { NHD_OFFSET_HV } from "./depth-limits";
import { orderTraverse, type TraversePoint, type TraverseRefusalCode } from "./traverse-points";

/** The core begins deeper than this many case depths. */
const CORE_BEGINS_AT_DEPTHS = 3;

/** From this many readings the mean of the core stands without a warning. */
const ENOUGH_CORE_READINGS = 3;

/** At 3 x CHD the hardness has to be below this, else a higher limit is agreed (ISO 2639; from memory). */
export const CHD_CORE_LIMIT_HV = 450;

const MOST_ROUNDS = 100;

export type CoreWarningCode = "few_core_readings";
export type CoreRefusalCode = TraverseRefusalCode | "no_core_readings" | "no_stable_core";

/** Whether so many readings beyond 3 x depth, or a core measured separately, make a core hardness. */
export function coreVerdict(input: {
  readonly readingsBeyond: number;
  readonly isMeasuredSeparately?: boolean;
}): Answer<object, CoreWarningCode> | Refusal<"no_core_readings"> {
  const { readingsBeyond } = input;
  if (input.isMeasuredSeparately || readingsBeyond >= ENOUGH_CORE_READINGS) return answer({});
  if (readingsBeyond < 1)
    return refuse(
      "no_core_readings",
      "No reading lies deeper than three times the depth. Enter a core hardness measured separately.",
    );
  const text = `The core rests on ${readingsBeyond === 1 ? "one reading" : "two readings"}.`;
  return answer({}, [{ code: "few_core_readings", text }]);
}

/** Readings deeper than three times a case depth. */
export function readingsBeyond<Point extends TraversePoint>(
  points: readonly Point[],
  depthMm: number,
): readonly Point[] {
  return points.filter((point) => point.depthMm > CORE_BEGINS_AT_DEPTHS * depthMm);
}

export interface IteratedCore<Point extends TraversePoint> {
  readonly coreHv: number;
  readonly coreReadings: readonly Point[];
}

/**
 * Core hardness of a nitrided traverse, where the limit itself rests on the core: start with the
 * deepest reading, find the depth, take the mean beyond three times that depth, repeat until those
 * readings stay the same. One or two of them: a warning. None: refused, a core value is needed.
 */
export function iterateCore<Point extends TraversePoint>(
  input: readonly Point[],
  offsetHv: number = NHD_OFFSET_HV,
): Answer<IteratedCore<Point>, CoreWarningCode> | Refusal<CoreRefusalCode> {
  const ordered = orderTraverse(input);
  if (ordered.verdict === "refuse") return ordered;
  const { points } = ordered;
  let coreReadings: readonly Point[] = points.slice(-1);
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const coreHv = mean(coreReadings.map((point) => point.hardness));
    const [crossing] = inwardCrossings(points, coreHv + offsetHv);
    const beyond = crossing ? readingsBeyond(points, crossing.depthMm) : [];
    const verdict = coreVerdict({ readingsBeyond: beyond.length });
    if (verdict.verdict === "refuse") return verdict;
    const isSettled = round > 0 && beyond.length === coreReadings.length;
    if (isSettled) return answer({ coreHv, coreReadings }, verdict.warnings);
    coreReadings = beyond;
  }
  return refuse(
    "no_stable_core",
    "The readings that make the core do not settle. Enter a core hardness measured separately.",
  );
}

/** Hardness of sorted readings at a depth, straight line; `null` beyond the deepest or shallowest. */
export function hardnessAtDepth(sorted: readonly TraversePoint[], depthMm: number): number | null {
  const index = lastAtOrBelow(
    sorted.map((point) => point.depthMm),
    depthMm,
  );
  const before = sorted[index];
  if (!before) return null;
  if (before.depthMm === depthMm) return before.hardness;
  const after = sorted[index + 1];
  if (!after) return null;
  const part = (depthMm - before.depthMm) / (after.depthMm - before.depthMm);
  return before.hardness + part * (after.hardness - before.hardness);
}

/** Whether CHD may be stated: at 3 x CHD below 450 HV. Source: ISO 2639 (from memory). */
export function chdApplicability(
  hardnessAtThreeDepthsHv: number,
  limitHv: number = CHD_CORE_LIMIT_HV,
): Answer<object, "core_too_hard"> {
  const text = `At three times the depth the hardness is ${hardnessAtThreeDepthsHv.toFixed(0)}\u00a0HV, not below ${limitHv}\u00a0HV: a higher limit has to be agreed, in steps of 25\u00a0HV.`;
  return answer({}, hardnessAtThreeDepthsHv < limitHv ? [] : [{ code: "core_too_hard", text }]);
}
