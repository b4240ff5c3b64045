import { isPositive, refuse, type Refusal } from "@/lib/numerics/verdict";
import { mmFromUm, umFromMm } from "@/lib/units/length";
import { distancePx, type Point } from "./point";
import { combined, COVERAGE_FACTOR } from "./uncertainty";

/** Size of a pixel with its relative expanded uncertainty, k = 2. */
export type PixelSize = { readonly umPerPx: number; readonly relativeUncertainty: number };

/** Two points nearer than this give no usable scale: a pixel either way is already a tenth. */
export const LEAST_SCALE_PX = 20;
/** Pixels whose two sides differ by more than this share are not square, and one scale is wrong. */
const SQUARE_WITHIN = 0.005;

const isUncertainty = (value: number) => Number.isFinite(value) && value >= 0;

/**
 * Pixel size from two points of known distance: s = D / N, and
 * (u(s)/s)2 = (u(D)/D)2 + (u(N)/N)2 with u(N) = sqrt(2) u(pick) for two independent ends
 * (GUM JCGM 100:2008, 5.1.6, relative form for a quotient).
 * @param knownDistanceUncertaintyMm expanded, k = 2
 * @param pickUncertaintyPx expanded, k = 2, of each end
 */
export function pixelSizeFromTwoPoints(input: {
  readonly points: readonly [Point, Point];
  readonly knownDistanceMm: number;
  readonly knownDistanceUncertaintyMm: number;
  readonly pickUncertaintyPx: number;
}): PixelSize | Refusal<"too_near" | "not_positive" | "bad_uncertainty" | "not_a_place"> {
  const { points, knownDistanceMm, knownDistanceUncertaintyMm, pickUncertaintyPx } = input;
  if (!isPositive(knownDistanceMm)) {
    return refuse("not_positive", "The known distance has to be a number above zero.");
  }
  if (!isUncertainty(knownDistanceUncertaintyMm) || !isUncertainty(pickUncertaintyPx)) {
    return refuse("bad_uncertainty", "An uncertainty has to be a number that is not below zero.");
  }
  const apartPx = distancePx(...points);
  if (!Number.isFinite(apartPx)) {
    return refuse("not_a_place", "A point of the scale is no place on a picture.");
  }
  if (apartPx < LEAST_SCALE_PX) {
    return refuse(
      "too_near",
      `The two points are ${apartPx.toFixed(1)} px apart. Take points at least ${LEAST_SCALE_PX} px apart, better the whole scale bar.`,
    );
  }
  return {
    umPerPx: umFromMm(knownDistanceMm) / apartPx,
    relativeUncertainty:
      COVERAGE_FACTOR *
      combined(
        knownDistanceUncertaintyMm / COVERAGE_FACTOR / knownDistanceMm,
        (Math.SQRT2 * pickUncertaintyPx) / COVERAGE_FACTOR / apartPx,
      ),
  };
}

/**
 * Pixel size from the file's own resolution, with the uncertainty that the person states for it
 * (k = 2, as a fraction): the file says none.
 */
export function pixelSizeFromFile(
  file: { readonly umPerPxX: number | null; readonly umPerPxY: number | null },
  relativeUncertainty: number,
): PixelSize | Refusal<"no_resolution" | "not_square" | "bad_uncertainty"> {
  const { umPerPxX, umPerPxY } = file;
  if (!isUncertainty(relativeUncertainty)) {
    return refuse("bad_uncertainty", "An uncertainty has to be a number that is not below zero.");
  }
  if (umPerPxX === null || umPerPxY === null || !isPositive(umPerPxX) || !isPositive(umPerPxY)) {
    return refuse("no_resolution", "The file says no resolution. Set the scale from two points.");
  }
  if (Math.abs(umPerPxX / umPerPxY - 1) > SQUARE_WITHIN) {
    return refuse(
      "not_square",
      "The file says pixels that are not square, so one scale does not fit both directions. Set the scale from two points.",
    );
  }
  return { umPerPx: (umPerPxX + umPerPxY) / 2, relativeUncertainty };
}

export type Measured = { readonly value: number; readonly expandedUncertainty: number };

/**
 * A length in mm with its expanded uncertainty: u(L)2 = (L u(s)/s)2 + (s u(N))2
 * (GUM JCGM 100:2008, 5.1.2 for L = s N).
 * @param pickUncertaintyPx standard, of the length in pixels
 */
export function lengthMm(lengthPx: number, pickUncertaintyPx: number, scale: PixelSize): Measured {
  const mmPerPx = mmFromUm(scale.umPerPx);
  const value = lengthPx * mmPerPx;
  const fromScale = (value * scale.relativeUncertainty) / COVERAGE_FACTOR;
  return {
    value,
    expandedUncertainty: COVERAGE_FACTOR * combined(fromScale, mmPerPx * pickUncertaintyPx),
  };
}

/**
 * An area in square millimetres: u(A)2 = (2 A u(s)/s)2 + (s2 u(N))2, since A goes with s squared
 * (GUM JCGM 100:2008, 5.1.6).
 * @param pickUncertaintyPx2 standard, of the area in square pixels
 */
export function areaMm2(areaPx2: number, pickUncertaintyPx2: number, scale: PixelSize): Measured {
  const mm2PerPx2 = mmFromUm(scale.umPerPx) ** 2;
  const value = areaPx2 * mm2PerPx2;
  const fromScale = (2 * value * scale.relativeUncertainty) / COVERAGE_FACTOR;
  return {
    value,
    expandedUncertainty: COVERAGE_FACTOR * combined(fromScale, mm2PerPx2 * pickUncertaintyPx2),
  };
}
