import { answer, isPositive, refuse, type Answer, type Refusal } from "../numerics/verdict";
import type { IndentRefusalCode } from "./vickers";

/**
 * HK = 1.451 F / d2, F in N, d the long diagonal in mm (ISO 4545-1; from memory).
 * ASTM E384 writes the same as 14229 P / d2 (gf, um).
 */
export const KNOOP_FACTOR = 1.451;

/** Long over short diagonal of a Knoop indent (geometry of the pyramid). */
export const KNOOP_DIAGONAL_RATIO = 7.114;

/** Knoop hardness of one indent, not rounded. Source: ISO 4545-1. */
export function knoopHardness(indent: {
  readonly forceN: number;
  readonly longDiagonalMm: number;
}): Answer<{ readonly hk: number }> | Refusal<IndentRefusalCode> {
  const { forceN, longDiagonalMm } = indent;
  if (!isPositive(forceN) || !isPositive(longDiagonalMm))
    return refuse("not_positive", "Force and diagonal have to be above zero.");
  return answer({ hk: (KNOOP_FACTOR * forceN) / longDiagonalMm ** 2 });
}

/** The long diagonal that an indent of this hardness and force has, mm; both above zero. */
export function knoopDiagonalMm(hk: number, forceN: number): number {
  return Math.sqrt((KNOOP_FACTOR * forceN) / hk);
}

/** Depth of the indent, about d / 30, mm (geometry of the pyramid). */
export function knoopIndentDepthMm(longDiagonalMm: number): number {
  return longDiagonalMm / 30;
}
