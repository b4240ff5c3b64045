import {
  answer,
  isPositive,
  refuse,
  type Answer,
  type Notice,
  type Refusal,
} from "../numerics/verdict";

/**
 * HV = 0.1891 F / d2, F in N, d in mm: 0.102 x 2 sin(136 deg / 2), rounded as ISO 6507-1 prints it.
 * ASTM E92 and E384 write the same as 1854.4 P / d2 (gf, um).
 */
export const VICKERS_FACTOR = 0.1891;

/** Below 0.020 mm the optics leave about 0.001 mm (ISO 6507-1; from memory). */
export const SMALLEST_VICKERS_DIAGONAL_MM = 0.02;
export const LARGEST_VICKERS_DIAGONAL_MM = 1.4;

/** The two diagonals may differ by this part before the report has to say so (ISO 6507-1; from memory). */
export const LARGEST_DIAGONAL_DIFFERENCE = 0.05;

export type VickersWarningCode = "diagonal_small" | "diagonal_large" | "diagonals_differ";
export type IndentRefusalCode = "not_positive" | "curved_surface";

export interface VickersResult {
  readonly hv: number;
  readonly meanDiagonalMm: number;
}

export interface VickersIndent {
  readonly forceN: number;
  /** One mean diagonal, or the two that were read. */
  readonly diagonalsMm: readonly [number] | readonly [number, number];
  /** A curved surface needs the factors of ISO 6507-1 Annex B, which are not here: refused. */
  readonly isCurvedSurface?: boolean;
}

/** What the size of an indent says about its reading, apart from its force. */
export function vickersDiagonalWarnings(
  diagonalsMm: readonly number[],
): readonly Notice<VickersWarningCode>[] {
  const warnings: Notice<VickersWarningCode>[] = [];
  const smallest = Math.min(...diagonalsMm);
  const largest = Math.max(...diagonalsMm);
  const meanMm = diagonalsMm.reduce((sum, d) => sum + d, 0) / diagonalsMm.length;
  if (meanMm < SMALLEST_VICKERS_DIAGONAL_MM)
    warnings.push({
      code: "diagonal_small",
      text: "The mean diagonal is below 0.020\u00a0mm, where optics limit the reading to about ±0.001\u00a0mm.",
    });
  if (meanMm > LARGEST_VICKERS_DIAGONAL_MM)
    warnings.push({ code: "diagonal_large", text: "The mean diagonal is above 1.400\u00a0mm." });
  if (largest - smallest > LARGEST_DIAGONAL_DIFFERENCE * smallest)
    warnings.push({
      code: "diagonals_differ",
      text: "The two diagonals differ by more than 5\u00a0%; the report says so.",
    });
  return warnings;
}

/** Vickers hardness of one indent, not rounded. Source: ISO 6507-1. */
export function vickersHardness(
  indent: VickersIndent,
): Answer<VickersResult, VickersWarningCode> | Refusal<IndentRefusalCode> {
  const { forceN, diagonalsMm } = indent;
  if (![forceN, ...diagonalsMm].every(isPositive))
    return refuse("not_positive", "Force and diagonals have to be above zero.");
  if (indent.isCurvedSurface)
    return refuse(
      "curved_surface",
      "A curved surface needs the factors of ISO 6507-1 Annex B, which are not entered.",
    );
  const meanDiagonalMm =
    diagonalsMm.length === 2 ? (diagonalsMm[0] + diagonalsMm[1]) / 2 : diagonalsMm[0];
  const hv = (VICKERS_FACTOR * forceN) / meanDiagonalMm ** 2;
  return answer({ hv, meanDiagonalMm }, vickersDiagonalWarnings(diagonalsMm));
}

/** The mean diagonal that an indent of this hardness and force has, mm; both above zero. */
export function vickersDiagonalMm(hv: number, forceN: number): number {
  return Math.sqrt((VICKERS_FACTOR * forceN) / hv);
}

/** Depth of the indent, about d / 7, mm (geometry of the pyramid). */
export function vickersIndentDepthMm(meanDiagonalMm: number): number {
  return meanDiagonalMm / 7;
}

/** Least thickness of the test piece, 1.5 d, mm (ISO 6507-1). */
export function vickersMinimumThicknessMm(hv: number, forceN: number): number {
  return 1.5 * vickersDiagonalMm(hv, forceN);
}
