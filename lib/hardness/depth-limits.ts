/**
 * Limit hardness of the three case depths.
 * CHD, carburized and carbonitrided: 550 HV1; another only by agreement, in steps of 25 HV (ISO 18203, ISO 2639).
 * SHD, induction, flame, laser: 0.8 of the specified minimum surface hardness (ISO 18203, DIN 50190-2).
 * NHD, nitrided: core hardness + 50 HV, HV0.5 (ISO 18203, DIN 50190-3).
 * A second edition of ISO 18203 was in publication at the end of 2025.
 */
export const CHD_LIMIT_HV = 550;
export const CHD_LIMIT_STEP_HV = 25;
export const SHD_FRACTION = 0.8;
export const NHD_OFFSET_HV = 50;

export type DepthKind = "SHD" | "CHD" | "NHD";

export const DEPTH_KINDS: Record<DepthKind, { readonly name: string; readonly loadKgf: number }> = {
  SHD: { name: "Surface hardening depth", loadKgf: 1 },
  CHD: { name: "Case hardening depth", loadKgf: 1 },
  NHD: { name: "Nitriding hardening depth", loadKgf: 0.5 },
};

export type ProcessKind =
  "induction" | "flame" | "carburized" | "carbonitrided" | "nitrided" | "none";

const PROPOSED: Record<ProcessKind, DepthKind | "none"> = {
  induction: "SHD",
  flame: "SHD",
  carburized: "CHD",
  carbonitrided: "CHD",
  nitrided: "NHD",
  none: "none",
};

/** The depth that a process asks for; another is a person's decision and needs a reason. */
export function proposedDepthKind(process: ProcessKind): DepthKind | "none" {
  return PROPOSED[process];
}

export function shdLimitHv(minimumSurfaceHv: number, fraction: number = SHD_FRACTION): number {
  return fraction * minimumSurfaceHv;
}

/** An agreed limit other than 550 HV lies a whole number of 25 HV steps from it. */
export function isChdLimitStep(limitHv: number): boolean {
  return (limitHv - CHD_LIMIT_HV) % CHD_LIMIT_STEP_HV === 0;
}
