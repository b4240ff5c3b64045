import { isPositive, type Refusal } from "../numerics/verdict";
import { radiansFromDegrees } from "../units/angle";
import { mmFromUm, umFromMm } from "../units/length";
import { testForceN } from "./forces";
import { knoopDiagonalMm, knoopHardness } from "./knoop";
import { taperDepthMm } from "./traverse-points";
import type { TraverseInput, TraverseReading } from "./traverse-input";
import { COVERAGE_FACTOR, relativeReadingUncertainty } from "./uncertainty";
import { vickersDiagonalMm, vickersDiagonalWarnings, vickersHardness } from "./vickers";

export type ReadingIssueCode =
  | "no_depth"
  | "negative_depth"
  | "no_hardness"
  | "one_diagonal_missing"
  | "not_positive"
  | "entered_differs"
  | "no_section_angle"
  | "diagonal_small"
  | "diagonal_large"
  | "diagonals_differ";

export interface ReadingIssue {
  readonly code: ReadingIssueCode;
  /** `must`: the reading cannot be used until it is mended. */
  readonly level: "must" | "noted";
  readonly text: string;
}

export interface EvaluatedReading {
  readonly id: string;
  /** Place in the list, from 1: "Indent 11". */
  readonly number: number;
  /** Perpendicular to the surface, mm. */
  readonly depthMm: number | null;
  /** Along the section, mm, as typed; what spacing and edge are judged by. */
  readonly distanceMm: number | null;
  readonly lateralMm: number | null;
  readonly track: string | undefined;
  /** HV or HK, not rounded. */
  readonly hardness: number | null;
  readonly computedFrom: "diagonals" | "entered" | null;
  /** Mean diagonal (Knoop: long diagonal); worked back from an entered hardness. */
  readonly meanDiagonalUm: number | null;
  readonly standardUncertainty: number | null;
  /** k = 2, from the reading of the diagonal (and the force where its uncertainty is given). */
  readonly expandedUncertainty: number | null;
  readonly leftOutReason: string | null;
  readonly keptReason: string | null;
  /** Has depth and hardness and is not left out. */
  readonly isInCurve: boolean;
  readonly issues: readonly ReadingIssue[];
}

/** An entered hardness may differ by this part from its own diagonals before it is remarked upon. */
const ENTERED_TOLERANCE = 0.01;

interface Measured {
  readonly hardness: number;
  readonly meanDiagonalMm: number;
  readonly computedFrom: "diagonals" | "entered";
}

const isGiven = (value: number | null | undefined): value is number => value != null;

function fromDiagonals(
  method: TraverseInput["method"],
  reading: TraverseReading,
  forceN: number,
): Measured | Refusal | null {
  const { d1Um, d2Um } = reading;
  if (method === "knoop") {
    if (!isGiven(d1Um)) return null;
    const longDiagonalMm = mmFromUm(d1Um);
    const result = knoopHardness({ forceN, longDiagonalMm });
    if (result.verdict === "refuse") return result;
    return { hardness: result.hk, meanDiagonalMm: longDiagonalMm, computedFrom: "diagonals" };
  }
  if (!isGiven(d1Um) || !isGiven(d2Um)) return null;
  const result = vickersHardness({ forceN, diagonalsMm: [mmFromUm(d1Um), mmFromUm(d2Um)] });
  if (result.verdict === "refuse") return result;
  return { hardness: result.hv, meanDiagonalMm: result.meanDiagonalMm, computedFrom: "diagonals" };
}

function fromEntered(
  method: TraverseInput["method"],
  entered: number | null | undefined,
  forceN: number,
): Measured | null {
  if (!isGiven(entered) || !isPositive(entered)) return null;
  const diagonalOf = method === "vickers" ? vickersDiagonalMm : knoopDiagonalMm;
  const meanDiagonalMm = diagonalOf(entered, forceN);
  return { hardness: entered, meanDiagonalMm, computedFrom: "entered" };
}

/** Hardness of one reading: its diagonals come first, an entered value only without them. */
function measure(
  method: TraverseInput["method"],
  reading: TraverseReading,
  forceN: number,
): { readonly measured: Measured | null; readonly issues: readonly ReadingIssue[] } {
  const { d1Um, d2Um, enteredHardness } = reading;
  const must = (code: ReadingIssueCode, text: string) => [{ code, text, level: "must" as const }];
  const byDiagonals = fromDiagonals(method, reading, forceN);
  if (byDiagonals && "verdict" in byDiagonals)
    return { measured: null, issues: must("not_positive", byDiagonals.reason) };
  const byEntry = fromEntered(method, enteredHardness, forceN);
  if (byDiagonals) {
    const diagonalsMm = [d1Um, d2Um].filter(isGiven).map(mmFromUm);
    const sizes = method === "vickers" ? vickersDiagonalWarnings(diagonalsMm) : [];
    const issues: ReadingIssue[] = sizes.map((warning) => ({ ...warning, level: "noted" }));
    const isFar =
      byEntry && Math.abs(byEntry.hardness / byDiagonals.hardness - 1) > ENTERED_TOLERANCE;
    if (isFar)
      issues.push({
        code: "entered_differs",
        level: "noted",
        text: "The hardness typed differs from the one its diagonals give; the diagonals count.",
      });
    return { measured: byDiagonals, issues };
  }
  if (byEntry) return { measured: byEntry, issues: [] };
  if (isGiven(enteredHardness))
    return { measured: null, issues: must("not_positive", "The hardness has to be above zero.") };
  if (isGiven(d1Um) || isGiven(d2Um))
    return {
      measured: null,
      issues: must("one_diagonal_missing", "One of the two diagonals is missing."),
    };
  return {
    measured: null,
    issues: must("no_hardness", "There is neither a hardness nor diagonals."),
  };
}

function placeInDepth(
  input: TraverseInput,
  distanceMm: number | null,
): { readonly depthMm: number | null; readonly issues: readonly ReadingIssue[] } {
  const must = (code: ReadingIssueCode, text: string) => ({
    depthMm: null,
    issues: [{ code, text, level: "must" as const }],
  });
  if (distanceMm === null || !Number.isFinite(distanceMm))
    return must("no_depth", "The depth is missing.");
  if (distanceMm < 0) return must("negative_depth", "A depth below zero lies outside the piece.");
  if (input.edgeReference !== "taper_section") return { depthMm: distanceMm, issues: [] };
  const angle = input.sectionAngleDeg;
  const sine = angle === undefined ? undefined : Math.sin(radiansFromDegrees(angle));
  const depthMm = taperDepthMm(distanceMm, sine);
  return typeof depthMm === "number"
    ? { depthMm, issues: [] }
    : must("no_section_angle", depthMm.reason);
}

export function evaluateReading(
  input: TraverseInput,
  reading: TraverseReading,
  index: number,
): EvaluatedReading {
  const place = placeInDepth(input, reading.depthMm);
  const { measured, issues } = measure(input.method, reading, testForceN(input.loadKgf));
  const relative =
    measured &&
    relativeReadingUncertainty({
      diagonalUncertainty: mmFromUm(input.diagonalUncertaintyUm),
      diagonal: measured.meanDiagonalMm,
      relativeForceUncertainty: input.relativeForceUncertainty,
    });
  const standardUncertainty =
    measured && typeof relative === "number" ? relative * measured.hardness : null;
  const leftOutReason = reading.leftOut?.reason ?? null;
  return {
    id: reading.id,
    number: index + 1,
    depthMm: place.depthMm,
    distanceMm: place.depthMm === null ? null : reading.depthMm,
    lateralMm: reading.lateralMm ?? null,
    track: reading.track ?? undefined,
    hardness: measured?.hardness ?? null,
    computedFrom: measured?.computedFrom ?? null,
    meanDiagonalUm: measured ? umFromMm(measured.meanDiagonalMm) : null,
    standardUncertainty,
    expandedUncertainty:
      standardUncertainty === null ? null : COVERAGE_FACTOR * standardUncertainty,
    leftOutReason,
    keptReason: reading.keptReason ?? null,
    isInCurve: leftOutReason === null && place.depthMm !== null && measured !== null,
    issues: [...place.issues, ...issues],
  };
}
