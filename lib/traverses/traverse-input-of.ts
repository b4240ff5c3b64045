import type { TraverseInput, TraverseReading } from "@/lib/hardness/traverse-input";
import type { TraverseContent, TypedReading } from "./schemas";
import { readCell } from "./typed-cells";

const given = <T>(value: T | null): T | undefined => value ?? undefined;

function bounds(range: { min: number | null; max: number | null } | null) {
  return range === null ? undefined : { min: given(range.min), max: given(range.max) };
}

function readingOf(typed: TypedReading): TraverseReading {
  const track = readCell("track", typed.track).value;
  return {
    id: typed.id,
    depthMm: readCell("depth", typed.depth).value,
    d1Um: readCell("d1", typed.d1).value,
    d2Um: readCell("d2", typed.d2).value,
    enteredHardness: readCell("hardness", typed.hardness).value,
    lateralMm: readCell("lateral", typed.lateral).value,
    track: track === null ? null : String(track),
    leftOut: typed.leftOutReason === undefined ? null : { reason: typed.leftOutReason },
    keptReason: typed.keptReason ?? null,
  };
}

/** What was typed, as numbers for the evaluation. A cell that cannot be read counts as empty. */
export function traverseInputOf(content: TraverseContent): TraverseInput {
  const { requiredSurface, requiredCore } = content;
  return {
    method: content.method,
    loadKgf: content.loadKgf,
    spacingClass: content.spacingClass,
    edgeReference: content.edgeReference,
    sectionAngleDeg: given(content.sectionAngleDeg),
    processKind: content.process,
    depthKind: content.depthKind,
    depthKindReason: content.depthKindReason || undefined,
    minSurfaceHv: given(content.minSurfaceHv),
    agreedLimit: given(content.agreedLimit),
    coreHv: given(content.coreHv),
    requiredDepthMm: bounds(content.requiredDepthMm),
    requiredSurface: requiredSurface
      ? { scale: requiredSurface.scale, ...bounds(requiredSurface) }
      : undefined,
    requiredCore: requiredCore ? { scale: requiredCore.scale, ...bounds(requiredCore) } : undefined,
    diagonalUncertaintyUm: content.diagonalUncertaintyUm,
    positionUncertaintyMm: content.positionUncertaintyMm,
    tracks: content.tracks,
    surfaceReadingIds: content.surfaceReadingIds,
    coreReadingIds: content.coreReadingIds,
    readings: content.readings.map(readingOf),
  };
}
