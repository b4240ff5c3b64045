import type { DepthKind, ProcessKind } from "./depth-limits";
import type { Scale } from "./scales";
import type { SpacingClass } from "./spacing";

/** One indent as it was typed. An empty cell is `null` or left out; it is never zero. */
export interface TraverseReading {
  readonly id: string;
  /** Distance of the centre from the reference edge, mm, along the section. */
  readonly depthMm: number | null;
  /** Vickers: first diagonal, um. Knoop: the long diagonal, um. */
  readonly d1Um?: number | null;
  /** Vickers: second diagonal, um. */
  readonly d2Um?: number | null;
  /** HV or HK of the traverse's method, where the diagonals are not known. */
  readonly enteredHardness?: number | null;
  readonly leftOut?: { readonly reason: string } | null;
  /** Why this indent stands although it lies too near the edge or a shallower indent. */
  readonly keptReason?: string | null;
  /** Which row of indents it belongs to, where there is more than one. */
  readonly track?: string | null;
  /** Place along the surface, mm, where the indents were set in zigzag. */
  readonly lateralMm?: number | null;
}

/** What the depth is counted from. A taper section needs its angle to the surface. */
export type EdgeReference = "surface" | "taper_section" | "none";

export interface HardnessRequirement {
  readonly scale: Scale;
  readonly min?: number;
  readonly max?: number;
}

export interface DepthRequirement {
  readonly min?: number;
  readonly max?: number;
}

export interface TraverseInput {
  readonly method: "vickers" | "knoop";
  readonly loadKgf: number;
  readonly spacingClass: SpacingClass;
  readonly edgeReference: EdgeReference;
  /** Between section and surface, degrees; for a taper section. */
  readonly sectionAngleDeg?: number;
  readonly processKind: ProcessKind;
  readonly depthKind: DepthKind | "none";
  /** Why the depth is not the one that the process asks for. */
  readonly depthKindReason?: string;
  /** Specified minimum surface hardness, HV; gives the SHD limit. */
  readonly minSurfaceHv?: number;
  /** Agreed limit, HV (HK for a Knoop traverse): for CHD instead of 550, for SHD instead of 0.8 of the minimum. */
  readonly agreedLimit?: number;
  /** Core hardness measured separately, HV, at a load not below that of the traverse. */
  readonly coreHv?: number;
  readonly coreLoadKgf?: number;
  readonly requiredDepthMm?: DepthRequirement;
  readonly requiredSurface?: HardnessRequirement;
  readonly requiredCore?: HardnessRequirement;
  /** Standard uncertainty of a mean diagonal, um. */
  readonly diagonalUncertaintyUm: number;
  /** Standard uncertainty of an indent's depth, mm. */
  readonly positionUncertaintyMm: number;
  /** u_F / F as a fraction; nothing when left out. */
  readonly relativeForceUncertainty?: number;
  /** `means` averages the tracks at each depth, only because someone asked for it. */
  readonly tracks?: "each" | "means";
  /** Readings whose mean is wanted as surface hardness, beside the shallowest one. */
  readonly surfaceReadingIds?: readonly string[];
  /** Readings whose mean is wanted as core hardness. */
  readonly coreReadingIds?: readonly string[];
  readonly readings: readonly TraverseReading[];
}
