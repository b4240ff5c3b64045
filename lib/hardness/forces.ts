import { newtonsFromKgf } from "../units/force";

export type ForceRange = "micro" | "low force" | "macro";

export interface NominalForce {
  readonly symbol: string;
  readonly forceKgf: number;
  /** As the standard prints it: HV1 is 9.807 N. */
  readonly forceN: number;
}

/** Nominal Vickers test forces. Source: ISO 6507-1 (from memory). */
export const VICKERS_FORCES = [
  { symbol: "HV0.01", forceKgf: 0.01, forceN: 0.09807 },
  { symbol: "HV0.015", forceKgf: 0.015, forceN: 0.1471 },
  { symbol: "HV0.02", forceKgf: 0.02, forceN: 0.1961 },
  { symbol: "HV0.025", forceKgf: 0.025, forceN: 0.2452 },
  { symbol: "HV0.05", forceKgf: 0.05, forceN: 0.4903 },
  { symbol: "HV0.1", forceKgf: 0.1, forceN: 0.9807 },
  { symbol: "HV0.2", forceKgf: 0.2, forceN: 1.961 },
  { symbol: "HV0.3", forceKgf: 0.3, forceN: 2.942 },
  { symbol: "HV0.5", forceKgf: 0.5, forceN: 4.903 },
  { symbol: "HV1", forceKgf: 1, forceN: 9.807 },
  { symbol: "HV2", forceKgf: 2, forceN: 19.61 },
  { symbol: "HV3", forceKgf: 3, forceN: 29.42 },
  { symbol: "HV5", forceKgf: 5, forceN: 49.03 },
  { symbol: "HV10", forceKgf: 10, forceN: 98.07 },
  { symbol: "HV20", forceKgf: 20, forceN: 196.1 },
  { symbol: "HV30", forceKgf: 30, forceN: 294.2 },
  { symbol: "HV50", forceKgf: 50, forceN: 490.3 },
  { symbol: "HV100", forceKgf: 100, forceN: 980.7 },
] as const satisfies readonly NominalForce[];

/** ISO 6507-1: micro below HV0.2, low force from HV0.2 to below HV5, macro from there on. */
export function vickersForceRange(forceN: number): ForceRange {
  if (forceN < 1.961) return "micro";
  return forceN < 49.03 ? "low force" : "macro";
}

/** The force in newtons: the printed one for a nominal load, the exact product for another. */
export function testForceN(loadKgf: number): number {
  const nominal = VICKERS_FORCES.find((force) => force.forceKgf === loadKgf);
  return nominal ? nominal.forceN : newtonsFromKgf(loadKgf);
}

/** Usual dwell under full force, s; another is part of the symbol (ISO 6507-1). */
const USUAL_DWELL_S = { from: 10, to: 15 } as const;

/**
 * How a hardness is written after its number: "HV1", "HK0.5", "HV30/20" with a dwell of 20 s. A load
 * that is not nominal is written out in newtons and forced to no symbol: "HV (7.355 N)".
 */
export function hardnessSymbol(input: {
  readonly method: "vickers" | "knoop";
  readonly loadKgf: number;
  readonly dwellS?: number;
}): string {
  const { loadKgf, dwellS } = input;
  const scale = input.method === "vickers" ? "HV" : "HK";
  const isNominal = VICKERS_FORCES.some((force) => force.forceKgf === loadKgf);
  const load = isNominal ? `${loadKgf}` : ` (${newtonsFromKgf(loadKgf).toPrecision(4)}\u00a0N)`;
  const isUsual =
    dwellS === undefined || (dwellS >= USUAL_DWELL_S.from && dwellS <= USUAL_DWELL_S.to);
  return `${scale}${load}${isUsual ? "" : `/${dwellS}`}`;
}
