import { readingsBeyond, coreVerdict } from "./core-hardness";
import { hardnessVerdict, type RequirementVerdict } from "./requirement";
import type { Scale } from "./scales";
import type { HardnessRequirement, TraverseInput } from "./traverse-input";
import { curveOf, type CurvePoint, type TrackDepth } from "./traverse-depth";
import type { EvaluatedReading } from "./traverse-reading";
import { meanHardness, type MeanHardness } from "./uncertainty";

export interface SurfaceHardness {
  /** Shallowest valid indent; a value at the surface itself is never extrapolated. */
  readonly shallowest: {
    readonly readingId: string;
    readonly depthMm: number;
    readonly hardness: number;
    readonly expandedUncertainty: number | null;
  } | null;
  /** Mean of the readings asked for. */
  readonly mean: (MeanHardness & { readonly readingIds: readonly string[] }) | null;
  /** Judged on the mean where one was asked for, else on the shallowest indent. */
  readonly requirement: RequirementVerdict | null;
}

export interface CoreHardness {
  readonly source: "entered" | "readings" | "beyond_three_depths" | null;
  readonly hardness: number | null;
  readonly n: number | null;
  readonly standardDeviation: number | null;
  readonly expandedUncertainty: number | null;
  readonly readingIds: readonly string[];
  /** Why there is no core hardness, or what weakens it. */
  readonly remark: string | null;
  readonly requirement: RequirementVerdict | null;
}

const scaleOf = (input: TraverseInput): Scale => (input.method === "vickers" ? "HV" : "HK");

function meanOf(points: readonly CurvePoint[]) {
  const summary = meanHardness(
    points.map((point) => ({
      value: point.hardness,
      standardUncertainty: point.standardUncertainty,
    })),
  );
  return summary && { ...summary, readingIds: points.flatMap((point) => point.readingIds) };
}

function pick(readings: readonly EvaluatedReading[], ids: readonly string[] | undefined) {
  return curveOf(readings.filter(({ id }) => ids?.includes(id) === true));
}

/** The surface asks at least for the hardness that its depth limit rests on. */
function surfaceRequirement(input: TraverseInput): HardnessRequirement | undefined {
  if (input.requiredSurface) return input.requiredSurface;
  return input.minSurfaceHv === undefined ? undefined : { scale: "HV", min: input.minSurfaceHv };
}

export function surfaceHardness(
  input: TraverseInput,
  readings: readonly EvaluatedReading[],
  tooNearEdge: ReadonlySet<string>,
): SurfaceHardness {
  const valid = readings.filter(
    ({ id, isInCurve, keptReason }) => isInCurve && (!tooNearEdge.has(id) || keptReason !== null),
  );
  const [first] = curveOf(valid).toSorted((a, b) => a.depthMm - b.depthMm);
  const shallowestReading = valid.find(({ id }) => first?.readingIds.includes(id) === true);
  const shallowest =
    first && shallowestReading
      ? {
          readingId: shallowestReading.id,
          depthMm: first.depthMm,
          hardness: first.hardness,
          expandedUncertainty: shallowestReading.expandedUncertainty,
        }
      : null;
  const mean = meanOf(pick(readings, input.surfaceReadingIds));
  const judged = mean
    ? { value: mean.mean, uncertainty: mean.expandedUncertainty }
    : shallowest && { value: shallowest.hardness, uncertainty: shallowest.expandedUncertainty };
  const requirement = hardnessVerdict(
    surfaceRequirement(input),
    judged && { ...judged, scale: scaleOf(input) },
  );
  return { shallowest, mean, requirement };
}

function coreWithoutRequirement(
  input: TraverseInput,
  readings: readonly EvaluatedReading[],
  track: TrackDepth | undefined,
): Omit<CoreHardness, "requirement"> {
  const none = { hardness: null, n: null, standardDeviation: null, expandedUncertainty: null };
  if (input.coreHv !== undefined)
    return { ...none, source: "entered", hardness: input.coreHv, readingIds: [], remark: null };
  const asked = pick(readings, input.coreReadingIds);
  const depth = track?.depth;
  const hasDepth = depth?.verdict === "ok" || depth?.verdict === "warn";
  const beyond = track && hasDepth ? readingsBeyond(track.points, depth.depthMm) : [];
  const points = asked.length > 0 ? asked : beyond;
  const core = meanOf(points);
  const verdict = coreVerdict({ readingsBeyond: points.length });
  const remark = verdict.verdict === "refuse" ? verdict.reason : verdict.warnings[0]?.text;
  if (!core) return { ...none, source: null, readingIds: [], remark: remark ?? null };
  return {
    source: asked.length > 0 ? "readings" : "beyond_three_depths",
    hardness: core.mean,
    n: core.n,
    standardDeviation: core.standardDeviation,
    expandedUncertainty: core.expandedUncertainty,
    readingIds: core.readingIds,
    remark: remark ?? null,
  };
}

export function coreHardness(
  input: TraverseInput,
  readings: readonly EvaluatedReading[],
  track: TrackDepth | undefined,
): CoreHardness {
  const core = coreWithoutRequirement(input, readings, track);
  const scale: Scale = core.source === "entered" ? "HV" : scaleOf(input);
  const measured =
    core.hardness === null
      ? null
      : { value: core.hardness, scale, uncertainty: core.expandedUncertainty };
  return { ...core, requirement: hardnessVerdict(input.requiredCore, measured) };
}
