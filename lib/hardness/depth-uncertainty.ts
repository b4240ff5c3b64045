import { expandedUncertainty } from "./uncertainty";
import type { TraversePoint } from "./traverse-points";

/** How the uncertainty of a depth is made up; shown beside the number. */
export const DEPTH_UNCERTAINTY_STATEMENT =
  "k = 2; from the hardness uncertainty of the two readings around the limit, and of the limit itself where it rests on a measured core, divided by the slope between them, with the uncertainty of position. Taken as independent.";

/**
 * Expanded uncertainty (k = 2) of an interpolated depth, first order (GUM): with t the place of the
 * limit between the readings (0 at the shallower), each reading counts with its own weight 1 - t or
 * t, hardness divided by the slope. Repeatability of the material is not in it.
 */
export function depthExpandedUncertaintyMm(input: {
  readonly above: TraversePoint;
  readonly below: TraversePoint;
  readonly limit: number;
  readonly aboveStandardUncertainty: number;
  readonly belowStandardUncertainty: number;
  readonly limitStandardUncertainty?: number;
  /** Standard uncertainty of each indent's depth, mm. */
  readonly positionStandardUncertaintyMm: number;
}): number {
  const { above, below, limit, positionStandardUncertaintyMm: position } = input;
  const fall = above.hardness - below.hardness;
  const slope = fall / (below.depthMm - above.depthMm);
  const place = (above.hardness - limit) / fall;
  return expandedUncertainty([
    ((1 - place) * input.aboveStandardUncertainty) / slope,
    (place * input.belowStandardUncertainty) / slope,
    (input.limitStandardUncertainty ?? 0) / slope,
    (1 - place) * position,
    place * position,
  ]);
}
