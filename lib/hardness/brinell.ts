import { answer, isPositive, refuse, type Answer, type Refusal } from "../numerics/verdict";
import { kgfFromNewtons } from "../units/force";

/** Indent diameter over ball diameter that ISO 6506-1 asks for (from memory). */
export const SMALLEST_DIAMETER_RATIO = 0.24;
export const LARGEST_DIAMETER_RATIO = 0.6;

export type BrinellWarningCode = "diameter_ratio";
export type BrinellRefusalCode = "not_positive" | "indent_not_below_ball";

export interface BrinellIndent {
  readonly forceN: number;
  readonly ballDiameterMm: number;
  /** Mean of the diameters that were read. */
  readonly indentDiameterMm: number;
}

export interface BrinellResult {
  readonly hbw: number;
  /** d / D. */
  readonly diameterRatio: number;
}

function refusalOfDiameters(
  ballDiameterMm: number,
  indentDiameterMm: number,
): Refusal<BrinellRefusalCode> | null {
  if (!isPositive(ballDiameterMm) || !isPositive(indentDiameterMm))
    return refuse("not_positive", "Ball and indent diameter have to be above zero.");
  return indentDiameterMm < ballDiameterMm
    ? null
    : refuse("indent_not_below_ball", "The indent cannot be as wide as the ball.");
}

/** Whether the indent of a ball is of a size that the test allows. Source: ISO 6506-1. */
export function brinellDiameterVerdict(
  ballDiameterMm: number,
  indentDiameterMm: number,
): Answer<{ readonly diameterRatio: number }, BrinellWarningCode> | Refusal<BrinellRefusalCode> {
  const refusal = refusalOfDiameters(ballDiameterMm, indentDiameterMm);
  if (refusal) return refusal;
  const diameterRatio = indentDiameterMm / ballDiameterMm;
  const isInside =
    diameterRatio >= SMALLEST_DIAMETER_RATIO && diameterRatio <= LARGEST_DIAMETER_RATIO;
  const text = `d/D is ${diameterRatio.toFixed(2)}, outside 0.24 to 0.60; the report says so.`;
  return answer({ diameterRatio }, isInside ? [] : [{ code: "diameter_ratio", text }]);
}

/**
 * Brinell hardness with a carbide ball, HBW = 2 (F / 9.80665) / (pi D (D - sqrt(D2 - d2))).
 * The exact 1 / 9.80665, not 0.102: with 0.102 the printed rows 2.40 and 2.50 mm come out one high.
 * Source: ISO 6506-1, ASTM E10.
 */
export function brinellHardness(
  indent: BrinellIndent,
): Answer<BrinellResult, BrinellWarningCode> | Refusal<BrinellRefusalCode> {
  const { forceN, ballDiameterMm: ball, indentDiameterMm: diameter } = indent;
  if (!isPositive(forceN)) return refuse("not_positive", "The force has to be above zero.");
  const verdict = brinellDiameterVerdict(ball, diameter);
  if (verdict.verdict === "refuse") return verdict;
  const cap = Math.PI * ball * (ball - Math.sqrt(ball ** 2 - diameter ** 2));
  const hbw = (2 * kgfFromNewtons(forceN)) / cap;
  return answer({ hbw, diameterRatio: verdict.diameterRatio }, verdict.warnings);
}

/** Depth of the indent, (D - sqrt(D2 - d2)) / 2, mm (geometry). */
export function brinellIndentDepthMm(
  ballDiameterMm: number,
  indentDiameterMm: number,
): number | Refusal<BrinellRefusalCode> {
  return (
    refusalOfDiameters(ballDiameterMm, indentDiameterMm) ??
    (ballDiameterMm - Math.sqrt(ballDiameterMm ** 2 - indentDiameterMm ** 2)) / 2
  );
}

/** Least thickness in indent depths: ISO 6506-1 asks for 8, ASTM E10 for 10 (from memory). */
const THICKNESS_IN_DEPTHS = { iso: 8, astm: 10 } as const;

export function brinellMinimumThicknessMm(
  ballDiameterMm: number,
  indentDiameterMm: number,
  standard: keyof typeof THICKNESS_IN_DEPTHS,
): number | Refusal<BrinellRefusalCode> {
  const depthMm = brinellIndentDepthMm(ballDiameterMm, indentDiameterMm);
  return typeof depthMm === "number" ? THICKNESS_IN_DEPTHS[standard] * depthMm : depthMm;
}
