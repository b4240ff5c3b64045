import { KNOOP_DIAGONAL_RATIO } from "./knoop";

export type SpacingClass = "steel_copper" | "light_metals";

/** A case-depth traverse may be denser than other indents (staggered rows allowed). */
export type SpacingUse = "case_depth" | "general";

export interface SpacingRule {
  readonly centreFactor: number;
  readonly edgeFactor: number;
  readonly standard: string;
}

export const SPACING_CLASSES = {
  steel_copper: { name: "Steel, copper and their alloys" },
  light_metals: { name: "Light metals, lead, tin and their alloys" },
} as const satisfies Record<SpacingClass, { name: string }>;

/**
 * Vickers, distances between centres and from centre to edge, in mean diagonals of the larger
 * indent. Source: ISO 6507-1:2018 (public excerpt).
 */
const VICKERS_RULES: Record<SpacingClass, SpacingRule> = {
  steel_copper: { centreFactor: 3, edgeFactor: 2.5, standard: "ISO 6507-1" },
  light_metals: { centreFactor: 6, edgeFactor: 3, standard: "ISO 6507-1" },
};

/** Case-depth traverses of steel. Source: ISO 2639, ISO 18203 (from memory). */
const CASE_DEPTH_RULE: SpacingRule = { centreFactor: 2.5, edgeFactor: 2.5, standard: "ISO 2639" };

export function vickersSpacingRule(spacingClass: SpacingClass, use: SpacingUse): SpacingRule {
  const isTraverse = use === "case_depth" && spacingClass === "steel_copper";
  return isTraverse ? CASE_DEPTH_RULE : VICKERS_RULES[spacingClass];
}

/** Least distance between the centres of two Vickers indents, mm; the larger indent governs. */
export function vickersMinimumSpacingMm(
  rule: SpacingRule,
  diagonalAMm: number,
  diagonalBMm: number = diagonalAMm,
): number {
  return rule.centreFactor * Math.max(diagonalAMm, diagonalBMm);
}

/** Least distance from the centre of a Vickers indent to the edge, mm. */
export function vickersMinimumEdgeMm(rule: SpacingRule, diagonalMm: number): number {
  return rule.edgeFactor * diagonalMm;
}

/**
 * Brinell and Rockwell: 3 d between centres, 2.5 d to the edge, d the mean indent diameter.
 * Source: ISO 6506-1, ISO 6508-1, ASTM E10 (from memory).
 */
export const BALL_RULE: SpacingRule = { centreFactor: 3, edgeFactor: 2.5, standard: "ISO 6506-1" };

/** Knoop gaps between limits of indents, in short diagonals b (ISO 4545-1; from memory). */
const KNOOP_SIDE_GAP = 2.5;
const KNOOP_EDGE_GAP = 3;
export const KNOOP_STANDARD = "ISO 4545-1";

/**
 * Least distance between centres of Knoop indents side by side, long diagonals parallel to the
 * surface, mm: a gap of 2.5 b of the larger indent, and half a short diagonal of either.
 */
export function knoopMinimumSpacingMm(longDiagonalAMm: number, longDiagonalBMm: number): number {
  const shortA = longDiagonalAMm / KNOOP_DIAGONAL_RATIO;
  const shortB = longDiagonalBMm / KNOOP_DIAGONAL_RATIO;
  return KNOOP_SIDE_GAP * Math.max(shortA, shortB) + (shortA + shortB) / 2;
}

/** Least distance between centres end to end, mm: a gap of one long diagonal of the larger indent. */
export function knoopMinimumEndSpacingMm(longDiagonalAMm: number, longDiagonalBMm: number): number {
  return Math.max(longDiagonalAMm, longDiagonalBMm) + (longDiagonalAMm + longDiagonalBMm) / 2;
}

/** Least distance from the centre to an edge beside the indent, mm: a gap of 3 b. */
export function knoopMinimumEdgeMm(longDiagonalMm: number): number {
  return (KNOOP_EDGE_GAP + 0.5) * (longDiagonalMm / KNOOP_DIAGONAL_RATIO);
}
