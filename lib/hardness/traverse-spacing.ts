import { quantityText } from "../numerics/number-text";
import { mmFromUm } from "../units/length";
import { KNOOP_DIAGONAL_RATIO } from "./knoop";
import {
  KNOOP_STANDARD,
  knoopMinimumEdgeMm,
  knoopMinimumEndSpacingMm,
  knoopMinimumSpacingMm,
  vickersMinimumEdgeMm,
  vickersMinimumSpacingMm,
  vickersSpacingRule,
} from "./spacing";
import type { TraverseInput } from "./traverse-input";
import type { EvaluatedReading } from "./traverse-reading";

/** Two indents too near one another, or one too near the edge. */
export interface SpacingFinding {
  readonly kind: "spacing" | "edge";
  readonly readingIds: readonly string[];
  readonly distanceMm: number;
  readonly requiredMm: number;
  readonly standard: string;
  /** "0.160 mm apart. 2.5 x d is 0.170 mm (ISO 2639)", without what rests on it. */
  readonly text: string;
}

export interface SpacingFindings {
  readonly findings: readonly SpacingFinding[];
  /** Findings beyond the first `MOST_FINDINGS`, counted but not listed. */
  readonly unlisted: number;
  /** Neighbours in different tracks whose distance is unknown, since no lateral place is given. */
  readonly hasUncheckedTracks: boolean;
}

/** A block of thousands of dense rows would list hundreds of thousands of pairs. */
const MOST_FINDINGS = 200;

/** A nanometre: distances are differences of decimal numbers and may miss by the last binary digit. */
const DISTANCE_TOLERANCE_MM = 1e-6;

interface Placed {
  readonly reading: EvaluatedReading;
  readonly distanceMm: number;
  readonly diagonalMm: number;
}

interface Shortfall {
  readonly distanceMm: number;
  readonly requiredMm: number;
  readonly rule: string;
  readonly standard: string;
}

const isShort = (distanceMm: number, requiredMm: number) =>
  distanceMm < requiredMm - DISTANCE_TOLERANCE_MM;

function vickersShortfall(input: TraverseInput, a: Placed, b: Placed): Shortfall | null {
  const use = input.depthKind === "none" ? "general" : "case_depth";
  const rule = vickersSpacingRule(input.spacingClass, use);
  const lateral = (b.reading.lateralMm ?? 0) - (a.reading.lateralMm ?? 0);
  const distanceMm = Math.hypot(b.distanceMm - a.distanceMm, lateral);
  const requiredMm = vickersMinimumSpacingMm(rule, a.diagonalMm, b.diagonalMm);
  if (!isShort(distanceMm, requiredMm)) return null;
  return { distanceMm, requiredMm, rule: `${rule.centreFactor} × d`, standard: rule.standard };
}

/** Knoop indents lie with the long diagonal along the surface: wide apart there, close in depth. */
function knoopShortfall(a: Placed, b: Placed): Shortfall | null {
  const distanceMm = b.distanceMm - a.distanceMm;
  const requiredMm = knoopMinimumSpacingMm(a.diagonalMm, b.diagonalMm);
  const lateral = Math.abs((b.reading.lateralMm ?? 0) - (a.reading.lateralMm ?? 0));
  const isClearEndToEnd = !isShort(lateral, knoopMinimumEndSpacingMm(a.diagonalMm, b.diagonalMm));
  if (!isShort(distanceMm, requiredMm) || isClearEndToEnd) return null;
  return {
    distanceMm,
    requiredMm,
    rule: "A gap of 2.5 × b between them",
    standard: KNOOP_STANDARD,
  };
}

function edgeShortfall(input: TraverseInput, placed: Placed): Shortfall | null {
  const { distanceMm, diagonalMm } = placed;
  if (input.method === "knoop") {
    const requiredMm = knoopMinimumEdgeMm(diagonalMm);
    if (!isShort(distanceMm, requiredMm)) return null;
    return { distanceMm, requiredMm, rule: "A gap of 3 × b to it", standard: KNOOP_STANDARD };
  }
  // The traverse rule loosens the spacing alone: the edge stays that of ISO 6507-1.
  const rule = vickersSpacingRule(input.spacingClass, "general");
  const requiredMm = vickersMinimumEdgeMm(rule, diagonalMm);
  if (!isShort(distanceMm, requiredMm)) return null;
  return { distanceMm, requiredMm, rule: `${rule.edgeFactor} × d`, standard: rule.standard };
}

const ruleText = ({ rule, requiredMm, standard }: Shortfall) =>
  `${rule} is ${quantityText(requiredMm, 3, "mm")} (${standard}).`;

function edgeFinding(placed: Placed, shortfall: Shortfall): SpacingFinding {
  const { reading } = placed;
  const { distanceMm, requiredMm, standard } = shortfall;
  const where = quantityText(distanceMm, 2, "mm");
  const text = `Indent ${reading.number} is ${where} from the edge. ${ruleText(shortfall)}`;
  return { kind: "edge", readingIds: [reading.id], distanceMm, requiredMm, standard, text };
}

function pairFinding(a: Placed, b: Placed, shortfall: Shortfall): SpacingFinding {
  const { distanceMm, requiredMm, standard } = shortfall;
  const apart = quantityText(distanceMm, 3, "mm");
  const text = `Indents ${a.reading.number} and ${b.reading.number} are ${apart} apart. ${ruleText(shortfall)}`;
  const readingIds = [a.reading.id, b.reading.id];
  return { kind: "spacing", readingIds, distanceMm, requiredMm, standard, text };
}

/** The farthest that two indents with these diagonals can be and still be too near. */
function longestReachMm(input: TraverseInput, largestDiagonalMm: number): number {
  if (input.method === "knoop") return (3.5 * largestDiagonalMm) / KNOOP_DIAGONAL_RATIO;
  return 6 * largestDiagonalMm;
}

/**
 * Every indent too near a neighbour or the edge, those left out included: an indent disturbs its
 * neighbour whether or not its own value counts. A pair is listed shallower reading first.
 */
export function findSpacing(
  input: TraverseInput,
  readings: readonly EvaluatedReading[],
): SpacingFindings {
  const placed = readings
    .flatMap((reading): Placed[] => {
      const { distanceMm, meanDiagonalUm } = reading;
      if (distanceMm === null || meanDiagonalUm === null) return [];
      return [{ reading, distanceMm, diagonalMm: mmFromUm(meanDiagonalUm) }];
    })
    .toSorted((a, b) => a.distanceMm - b.distanceMm);
  const reachMm = longestReachMm(
    input,
    placed.reduce((largest, { diagonalMm }) => Math.max(largest, diagonalMm), 0),
  );
  const findings: SpacingFinding[] = [];
  let unlisted = 0;
  let hasUncheckedTracks = false;
  const list = (finding: () => SpacingFinding) => {
    if (findings.length < MOST_FINDINGS) findings.push(finding());
    else unlisted += 1;
  };
  placed.forEach((a, index) => {
    const edge = input.edgeReference === "none" ? null : edgeShortfall(input, a);
    if (edge) list(() => edgeFinding(a, edge));
    for (let next = index + 1; next < placed.length; next += 1) {
      const b = placed[next];
      if (!b || b.distanceMm - a.distanceMm >= reachMm) break;
      const isUnknown =
        a.reading.track !== b.reading.track &&
        (a.reading.lateralMm === null || b.reading.lateralMm === null);
      if (isUnknown) {
        hasUncheckedTracks = true;
        continue;
      }
      const pair = input.method === "knoop" ? knoopShortfall(a, b) : vickersShortfall(input, a, b);
      if (pair) list(() => pairFinding(a, b, pair));
    }
  });
  return { findings, unlisted, hasUncheckedTracks };
}
