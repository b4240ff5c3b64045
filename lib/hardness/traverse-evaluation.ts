import { refuse, type Refusal } from "../numerics/verdict";
import type { CaseDepth } from "./case-depth";
import type { DepthKind } from "./depth-limits";
import { DEPTH_UNCERTAINTY_STATEMENT } from "./depth-uncertainty";
import { hardnessSymbol } from "./forces";
import { depthVerdict, type RequirementVerdict } from "./requirement";
import {
  curveOf,
  depthOfTracks,
  headlineTrack,
  type CurvePoint,
  type DepthLimit,
  type TrackDepth,
} from "./traverse-depth";
import type { TraverseInput } from "./traverse-input";
import { traverseItems, type TraverseItem } from "./traverse-items";
import { evaluateReading, type EvaluatedReading } from "./traverse-reading";
import { findSpacing, type SpacingFindings } from "./traverse-spacing";
import {
  coreHardness,
  surfaceHardness,
  type CoreHardness,
  type SurfaceHardness,
} from "./traverse-values";

export interface TraverseDepth {
  readonly kind: DepthKind;
  readonly limit: DepthLimit | null;
  /** Depth of the track named in `track`, the most cautious where there are several. */
  readonly depth: CaseDepth<CurvePoint> | Refusal;
  readonly expandedUncertaintyMm: number | null;
  readonly uncertaintyStatement: string;
  readonly restsOn: readonly string[];
  readonly track: string | undefined;
  readonly tracks: readonly TrackDepth[];
  readonly requirement: RequirementVerdict | null;
}

export interface TraverseEvaluation {
  /** "HV1": written after every hardness of this traverse. */
  readonly symbol: string;
  readonly readings: readonly EvaluatedReading[];
  readonly spacing: SpacingFindings;
  /** `null` when the traverse is for no depth. */
  readonly depth: TraverseDepth | null;
  readonly surface: SurfaceHardness;
  readonly core: CoreHardness;
  readonly items: readonly TraverseItem[];
  readonly toSettle: readonly TraverseItem[];
  readonly noted: readonly TraverseItem[];
  readonly settled: readonly TraverseItem[];
}

function noSurface(): TrackDepth {
  const reason = "A depth needs a surface to count from; this traverse has no reference edge.";
  return {
    track: undefined,
    points: [],
    limit: null,
    depth: refuse("no_reference_edge", reason),
    expandedUncertaintyMm: null,
    restsOn: [],
    warnings: [],
  };
}

function evaluateDepth(
  input: TraverseInput,
  curve: readonly CurvePoint[],
): { readonly tracks: readonly TrackDepth[]; readonly headline: TrackDepth } | null {
  if (input.depthKind === "none") return null;
  const tracks =
    input.edgeReference === "none" ? [noSurface()] : depthOfTracks(input.depthKind, input, curve);
  const headline = headlineTrack(tracks);
  return headline ? { tracks, headline } : null;
}

/**
 * Everything that follows from the readings of a hardness traverse: hardness and uncertainty of each
 * indent, indents too near one another or the edge, depth, surface and core with their requirements,
 * and what is left to settle. The same function serves the screen as it is typed and the stored
 * result. Nothing is rounded, nothing extrapolated; what cannot be said comes as a reason.
 */
export function evaluateTraverse(input: TraverseInput): TraverseEvaluation {
  const readings = input.readings.map((reading, index) => evaluateReading(input, reading, index));
  const curve = curveOf(readings);
  const spacing = findSpacing(input, readings);
  const found = evaluateDepth(input, curve);
  const headline = found?.headline;
  const tooNearEdge = new Set(
    spacing.findings.filter(({ kind }) => kind === "edge").flatMap(({ readingIds }) => readingIds),
  );
  const restsOn = new Set(found?.tracks.flatMap((track) => track.restsOn) ?? []);
  const items = traverseItems({
    traverse: input,
    readings,
    spacing,
    tracks: found?.tracks ?? [],
    headline,
    restsOn,
  });
  const shallowestMm = curve.length > 0 ? Math.min(...curve.map(({ depthMm }) => depthMm)) : null;
  return {
    symbol: hardnessSymbol(input),
    readings,
    spacing,
    depth:
      headline && input.depthKind !== "none"
        ? {
            kind: input.depthKind,
            limit: headline.limit,
            depth: headline.depth,
            expandedUncertaintyMm: headline.expandedUncertaintyMm,
            uncertaintyStatement: DEPTH_UNCERTAINTY_STATEMENT,
            restsOn: headline.restsOn,
            track: headline.track,
            tracks: found.tracks,
            requirement: depthVerdict(
              input.requiredDepthMm,
              headline.depth,
              headline.expandedUncertaintyMm,
              shallowestMm,
            ),
          }
        : null,
    surface: surfaceHardness(input, readings, tooNearEdge),
    core: coreHardness(input, readings, headline),
    items,
    toSettle: items.filter(({ level }) => level === "must"),
    noted: items.filter(({ level }) => level === "noted"),
    settled: items.filter(({ level }) => level === "settled"),
  };
}
