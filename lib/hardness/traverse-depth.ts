import { mean } from "../numerics/statistics";
import { isPositive, refuse, type Notice, type Refusal } from "../numerics/verdict";
import { caseDepth, type CaseDepth } from "./case-depth";
import { chdApplicability, hardnessAtDepth, iterateCore } from "./core-hardness";
import {
  CHD_LIMIT_HV,
  isChdLimitStep,
  NHD_OFFSET_HV,
  SHD_FRACTION,
  shdLimitHv,
  type DepthKind,
} from "./depth-limits";
import { depthExpandedUncertaintyMm } from "./depth-uncertainty";
import type { TraverseInput } from "./traverse-input";
import { atEachDepth, byTrack, type TraversePoint } from "./traverse-points";
import type { EvaluatedReading } from "./traverse-reading";
import { meanHardness, type MeanHardness } from "./uncertainty";

/** A point of the curve and the reading (or, with track means, readings) behind it. */
export interface CurvePoint extends TraversePoint {
  readonly readingIds: readonly string[];
  readonly standardUncertainty: number;
}

export interface DepthLimit {
  readonly limit: number;
  /** "448 HV = 0.8 of 560": where the limit comes from. */
  readonly basis: string;
  readonly standardUncertainty: number;
  /** Readings whose mean is the core, where the limit rests on one. */
  readonly core?: MeanHardness & { readonly readingIds: readonly string[] };
}

export interface TrackDepth {
  readonly track: string | undefined;
  readonly points: readonly CurvePoint[];
  readonly limit: DepthLimit | null;
  readonly depth: CaseDepth<CurvePoint> | Refusal;
  readonly expandedUncertaintyMm: number | null;
  /** Readings the depth rests on: those around the crossing. */
  readonly restsOn: readonly string[];
  readonly warnings: readonly Notice[];
}

export function curveOf(readings: readonly EvaluatedReading[]): readonly CurvePoint[] {
  return readings.flatMap(({ isInCurve, depthMm, hardness, id, track, standardUncertainty }) =>
    isInCurve && depthMm !== null && hardness !== null
      ? [
          {
            depthMm,
            hardness,
            track,
            readingIds: [id],
            standardUncertainty: standardUncertainty ?? 0,
          },
        ]
      : [],
  );
}

function meanCurve(points: readonly CurvePoint[]): readonly CurvePoint[] {
  return atEachDepth(points).map(([depthMm, group]) => ({
    depthMm,
    hardness: mean(group.map((point) => point.hardness)),
    readingIds: group.flatMap((point) => point.readingIds),
    standardUncertainty: mean(group.map((point) => point.standardUncertainty)),
  }));
}

function agreedBasis(limit: number, unit: string): DepthLimit {
  return { limit, basis: `${limit}\u00a0${unit}, agreed`, standardUncertainty: 0 };
}

function coreLimit(
  input: TraverseInput,
  points: readonly CurvePoint[],
): { readonly limit: DepthLimit; readonly warnings: readonly Notice[] } | Refusal {
  const basisOf = (coreHv: number) =>
    `${(coreHv + NHD_OFFSET_HV).toFixed(0)}\u00a0HV = core ${coreHv.toFixed(0)} + ${NHD_OFFSET_HV}`;
  if (input.coreHv !== undefined) {
    const { coreHv } = input;
    if (!isPositive(coreHv)) return refuse("no_limit", "The core hardness has to be above zero.");
    if (input.coreLoadKgf !== undefined && input.coreLoadKgf < input.loadKgf)
      return refuse(
        "core_load_too_low",
        "The core was measured at a lower load than the traverse.",
      );
    const limit = coreHv + NHD_OFFSET_HV;
    return { limit: { limit, basis: basisOf(coreHv), standardUncertainty: 0 }, warnings: [] };
  }
  const found = iterateCore(points);
  if (found.verdict === "refuse") return found;
  const readings = found.coreReadings.map((point) => ({
    value: point.hardness,
    standardUncertainty: point.standardUncertainty,
  }));
  const core = meanHardness(readings);
  if (!core) return refuse("no_core_readings", "There is no core reading.");
  const limit: DepthLimit = {
    limit: found.coreHv + NHD_OFFSET_HV,
    basis: basisOf(found.coreHv),
    standardUncertainty: (core.expandedUncertainty ?? 0) / 2,
    core: { ...core, readingIds: found.coreReadings.flatMap((point) => point.readingIds) },
  };
  return { limit, warnings: found.warnings };
}

function limitFor(
  kind: DepthKind,
  input: TraverseInput,
  points: readonly CurvePoint[],
): { readonly limit: DepthLimit; readonly warnings: readonly Notice[] } | Refusal {
  const { agreedLimit, minSurfaceHv } = input;
  if (agreedLimit !== undefined && !isPositive(agreedLimit))
    return refuse("no_limit", "The limit hardness has to be above zero.");
  if (input.method === "knoop")
    return agreedLimit === undefined || kind === "NHD"
      ? refuse(
          "limit_in_another_scale",
          "The limit is in HV and the readings are HK. Agree on a limit in HK, or measure in HV.",
        )
      : { limit: agreedBasis(agreedLimit, "HK"), warnings: [] };
  if (kind === "NHD") return coreLimit(input, points);
  if (kind === "CHD") {
    if (agreedLimit === undefined || agreedLimit === CHD_LIMIT_HV) {
      const basis = `${CHD_LIMIT_HV}\u00a0HV`;
      return { limit: { limit: CHD_LIMIT_HV, basis, standardUncertainty: 0 }, warnings: [] };
    }
    const text = `A limit other than ${CHD_LIMIT_HV}\u00a0HV is agreed in steps of 25\u00a0HV; ${agreedLimit} is not one.`;
    const warnings = isChdLimitStep(agreedLimit) ? [] : [{ code: "limit_not_a_step", text }];
    return { limit: agreedBasis(agreedLimit, "HV"), warnings };
  }
  if (agreedLimit !== undefined) return { limit: agreedBasis(agreedLimit, "HV"), warnings: [] };
  if (minSurfaceHv === undefined || !isPositive(minSurfaceHv))
    return refuse(
      "no_limit",
      "SHD needs the specified minimum surface hardness in HV, or an agreed limit.",
    );
  const limit = shdLimitHv(minSurfaceHv);
  const basis = `${limit.toFixed(0)}\u00a0HV = ${SHD_FRACTION} of ${minSurfaceHv}`;
  return { limit: { limit, basis, standardUncertainty: 0 }, warnings: [] };
}

/** Whether the core is soft enough for CHD, from a separate core value or the curve itself. */
function coreWarnings(
  input: TraverseInput,
  points: readonly CurvePoint[],
  depthMm: number,
): readonly Notice[] {
  const sorted = points.toSorted((a, b) => a.depthMm - b.depthMm);
  const atThreeDepths = input.coreHv ?? hardnessAtDepth(sorted, 3 * depthMm);
  if (atThreeDepths !== null) return chdApplicability(atThreeDepths).warnings;
  const text =
    "The traverse ends before three times the depth; whether the core is below 450\u00a0HV is not checked.";
  return [{ code: "core_not_checked", text }];
}

function evaluateTrack(
  kind: DepthKind,
  input: TraverseInput,
  track: string | undefined,
  points: readonly CurvePoint[],
): TrackDepth {
  const none = { track, points, expandedUncertaintyMm: null, restsOn: [] };
  const found = limitFor(kind, input, points);
  if ("verdict" in found) return { ...none, limit: null, depth: found, warnings: [] };
  const { limit, warnings } = found;
  const depth = caseDepth({ points, limit: limit.limit });
  if (depth.verdict !== "ok" && depth.verdict !== "warn")
    return { ...none, limit, depth, warnings };
  const [crossing] = depth.crossings;
  if (!crossing) return { ...none, limit, depth, warnings };
  const { above, below } = crossing;
  return {
    track,
    points,
    limit,
    depth,
    expandedUncertaintyMm: depthExpandedUncertaintyMm({
      above,
      below,
      limit: limit.limit,
      aboveStandardUncertainty: above.standardUncertainty,
      belowStandardUncertainty: below.standardUncertainty,
      limitStandardUncertainty: limit.standardUncertainty,
      positionStandardUncertaintyMm: input.positionUncertaintyMm,
    }),
    restsOn: [...above.readingIds, ...below.readingIds],
    warnings: [
      ...warnings,
      ...depth.warnings,
      ...(kind === "CHD" && input.method === "vickers"
        ? coreWarnings(input, points, depth.depthMm)
        : []),
    ],
  };
}

function trackMissing(points: readonly CurvePoint[]): TrackDepth {
  const reason = "Some readings have a track and some have none. Give every reading its track.";
  const depth = refuse("track_missing", reason);
  const none = { limit: null, expandedUncertaintyMm: null, restsOn: [], warnings: [] };
  return { track: undefined, points, depth, ...none };
}

/** The depth of each track, or of their means where those were asked for. */
export function depthOfTracks(
  kind: DepthKind,
  input: TraverseInput,
  curve: readonly CurvePoint[],
): readonly TrackDepth[] {
  if (input.tracks === "means") return [evaluateTrack(kind, input, undefined, meanCurve(curve))];
  const withTrack = curve.filter((point) => point.track !== undefined);
  if (withTrack.length === 0) return [evaluateTrack(kind, input, undefined, curve)];
  if (withTrack.length < curve.length) return [trackMissing(curve)];
  return [...byTrack(curve)].map(([track, points]) => evaluateTrack(kind, input, track, points));
}

/** The most cautious track: one without an answer, then one that is not reached, then the shallowest. */
export function headlineTrack(tracks: readonly TrackDepth[]): TrackDepth | undefined {
  const rank = ({ depth }: TrackDepth) => {
    if (depth.verdict === "refuse") return -2;
    if (depth.verdict === "not_reached") return -1;
    return depth.verdict === "beyond_last_reading" ? Infinity : depth.depthMm;
  };
  return tracks.toSorted((a, b) => rank(a) - rank(b) || 0)[0];
}
