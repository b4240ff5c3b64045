import { groupBy } from "../numerics/group-by";
import { mean } from "../numerics/statistics";
import {
  answer,
  isPositive,
  refuse,
  type Answer,
  type Notice,
  type Refusal,
} from "../numerics/verdict";

/** One reading of a traverse, depth perpendicular to the surface. */
export interface TraversePoint {
  readonly depthMm: number;
  readonly hardness: number;
  /** Which row the reading belongs to, where there is more than one. */
  readonly track?: string;
  /** Force symbol of the reading, where readings of several forces stand together. */
  readonly load?: string;
}

export type TraverseRefusalCode =
  | "too_few_readings"
  | "not_a_number"
  | "negative_depth"
  | "equal_depths"
  | "mixed_loads"
  | "no_section_angle";

/** Depth below the surface from a distance along a taper section; refused without its angle. */
export function taperDepthMm(
  distanceMm: number,
  sectionAngleSine: number | undefined,
): number | Refusal<"no_section_angle"> {
  return sectionAngleSine === undefined || !isPositive(sectionAngleSine) || sectionAngleSine > 1
    ? refuse(
        "no_section_angle",
        "A taper section needs its angle: depth is distance times its sine.",
      )
    : distanceMm * sectionAngleSine;
}

/**
 * Sorted by depth, or the reason why the readings make no curve. Equal depths belong to different
 * rows and need a track each; readings at different loads share a curve only when a person says so.
 */
export function orderTraverse<Point extends TraversePoint>(
  points: readonly Point[],
  options: { readonly isOneCurve?: boolean; readonly leastReadings?: number } = {},
): Answer<{ readonly points: readonly Point[] }, "mixed_loads"> | Refusal<TraverseRefusalCode> {
  const least = options.leastReadings ?? 2;
  if (points.length < least)
    return refuse(
      "too_few_readings",
      `A depth needs ${least} readings; there are ${points.length}.`,
    );
  if (!points.every(({ depthMm, hardness }) => Number.isFinite(depthMm) && isPositive(hardness)))
    return refuse("not_a_number", "Every reading needs a depth and a hardness above zero.");
  if (points.some(({ depthMm }) => depthMm < 0))
    return refuse("negative_depth", "A depth below zero lies outside the piece.");

  const seen = new Set<string>();
  const depths = new Map<number, boolean>();
  for (const { depthMm, track } of points) {
    const key = `${depthMm}/${track ?? ""}`;
    const sameDepthHadTrack = depths.get(depthMm);
    const needsTrack =
      sameDepthHadTrack !== undefined && !(sameDepthHadTrack && track !== undefined);
    if (needsTrack || seen.has(key))
      return refuse(
        "equal_depths",
        `Depth ${depthMm}\u00a0mm is there twice. Give each row of indents its own track, or correct the depth.`,
      );
    seen.add(key);
    depths.set(depthMm, track !== undefined);
  }

  const warnings: Notice<"mixed_loads">[] = [];
  if (new Set(points.map(({ load }) => load)).size > 1) {
    if (!options.isOneCurve)
      return refuse(
        "mixed_loads",
        "Readings at different loads make one curve only if you say so.",
      );
    warnings.push({ code: "mixed_loads", text: "Readings at different loads share one curve." });
  }
  return answer({ points: points.toSorted((a, b) => a.depthMm - b.depthMm) }, warnings);
}

/** The readings of each track, in the order in which the tracks first appear. */
export function byTrack<Point extends TraversePoint>(
  points: readonly Point[],
): ReadonlyMap<string | undefined, readonly Point[]> {
  return groupBy(points, (point) => point.track);
}

/** The readings of all tracks at each depth. */
export function atEachDepth<Point extends TraversePoint>(
  points: readonly Point[],
): readonly (readonly [number, readonly Point[]])[] {
  return [...groupBy(points, (point) => point.depthMm)];
}

/** One reading at each depth, the mean of the tracks; only for those who ask for it. */
export function trackMeans(points: readonly TraversePoint[]): readonly TraversePoint[] {
  return atEachDepth(points).map(([depthMm, group]) => ({
    depthMm,
    hardness: mean(group.map((point) => point.hardness)),
  }));
}
