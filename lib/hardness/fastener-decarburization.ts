import { answer, isPositive, refuse, type Answer, type Refusal } from "../numerics/verdict";

export type PropertyClass = "8.8" | "9.8" | "10.9" | "12.9";

export const PROPERTY_CLASSES = ["8.8", "9.8", "10.9", "12.9"] as const satisfies PropertyClass[];

type EColumn = "8.8/9.8" | "10.9" | "12.9";

const columnOf = (propertyClass: PropertyClass): EColumn =>
  propertyClass === "8.8" || propertyClass === "9.8" ? "8.8/9.8" : propertyClass;

/** Complete decarburization, depth G, at most 0.015 mm (ISO 898-1; from memory). */
export const G_MAX_UM = 15;

/**
 * Least height E of the undecarburized thread, in micrometres, as the standard prints it: fractions
 * of the rounded thread height H1. Source: ISO 898-1 table of decarburization (from memory).
 */
const E_MIN_UM: readonly (Record<EColumn, number> & { readonly pitchMm: number })[] = [
  { pitchMm: 0.5, "8.8/9.8": 154, "10.9": 205, "12.9": 230 },
  { pitchMm: 0.6, "8.8/9.8": 184, "10.9": 245, "12.9": 276 },
  { pitchMm: 0.7, "8.8/9.8": 215, "10.9": 286, "12.9": 322 },
  { pitchMm: 0.8, "8.8/9.8": 245, "10.9": 327, "12.9": 368 },
  { pitchMm: 1, "8.8/9.8": 307, "10.9": 409, "12.9": 460 },
  { pitchMm: 1.25, "8.8/9.8": 384, "10.9": 511, "12.9": 575 },
  { pitchMm: 1.5, "8.8/9.8": 460, "10.9": 613, "12.9": 690 },
  { pitchMm: 1.75, "8.8/9.8": 537, "10.9": 716, "12.9": 806 },
  { pitchMm: 2, "8.8/9.8": 614, "10.9": 818, "12.9": 920 },
  { pitchMm: 2.5, "8.8/9.8": 767, "10.9": 1023, "12.9": 1151 },
  { pitchMm: 3, "8.8/9.8": 920, "10.9": 1227, "12.9": 1380 },
  { pitchMm: 3.5, "8.8/9.8": 1074, "10.9": 1431, "12.9": 1610 },
  { pitchMm: 4, "8.8/9.8": 1227, "10.9": 1636, "12.9": 1841 },
];

const H1_FRACTION: Record<EColumn, number> = { "8.8/9.8": 1 / 2, "10.9": 2 / 3, "12.9": 3 / 4 };

/** Least E in micrometres; the equation H1 = (17/24)(sqrt 3 / 2) P serves a pitch not printed. */
export function leastThreadHeightUm(
  pitchMm: number,
  propertyClass: PropertyClass,
): number | Refusal<"not_positive"> {
  if (!isPositive(pitchMm)) return refuse("not_positive", "The pitch has to be above zero.");
  const column = columnOf(propertyClass);
  const printed = E_MIN_UM.find((row) => row.pitchMm === pitchMm);
  if (printed) return printed[column];
  const roundedH1Um = Math.round((17 / 24) * (Math.sqrt(3) / 2) * pitchMm * 1000);
  return Math.round(H1_FRACTION[column] * roundedH1Um);
}

export type RequirementWord = "pass" | "fail";

/** Height of the undecarburized thread against its least value, compared in whole micrometres. */
export function threadHeightVerdict(input: {
  readonly pitchMm: number;
  readonly propertyClass: PropertyClass;
  readonly heightMm: number;
}): RequirementWord | Refusal<"not_positive"> {
  const least = leastThreadHeightUm(input.pitchMm, input.propertyClass);
  if (typeof least !== "number") return least;
  if (!(Number.isFinite(input.heightMm) && input.heightMm >= 0))
    return refuse("not_positive", "The height has to be a number, zero or above.");
  return Math.round(input.heightMm * 1000) >= least ? "pass" : "fail";
}

/** The hardness method is for pitches from 1.25 mm (ISO 898-1:2013, public summary). */
const LEAST_PITCH_FOR_HARDNESS_MM = 1.25;

/** Whether the hardness method may be used: classes 8.8 to 12.9, pitch 1.25 mm and above. */
export function hardnessMethodApplies(
  pitchMm: number,
  propertyClass: string,
): Answer<object> | Refusal<"use_microscopic_method"> {
  const isHardened = PROPERTY_CLASSES.some((known) => known === propertyClass);
  return pitchMm >= LEAST_PITCH_FOR_HARDNESS_MM && isHardened
    ? answer({})
    : refuse(
        "use_microscopic_method",
        "The hardness method is for pitches from 1.25\u00a0mm and classes 8.8 to 12.9. Use the microscopic method.",
      );
}

/** Points 2 and 3 may differ from point 1 by this much, HV0.3 (ISO 898-1; from memory). */
const LARGEST_DIFFERENCE_HV = 30;

/** Three-point hardness method, HV0.3. Source: ISO 898-1 (from memory). */
export function threePointVerdict(
  hv1: number,
  hv2: number,
  hv3: number,
):
  | "pass"
  | "fail_decarburized"
  | "fail_carburized"
  | "fail_decarburized+carburized"
  | Refusal<"not_positive"> {
  if (![hv1, hv2, hv3].every(isPositive))
    return refuse("not_positive", "The three readings have to be above zero.");
  const isDecarburized = hv2 < hv1 - LARGEST_DIFFERENCE_HV;
  const isCarburized = hv3 > hv1 + LARGEST_DIFFERENCE_HV;
  if (isDecarburized && isCarburized) return "fail_decarburized+carburized";
  if (isDecarburized) return "fail_decarburized";
  return isCarburized ? "fail_carburized" : "pass";
}

/** Highest surface hardness, HV0.3 (ISO 898-1 table notes, read). */
const HIGHEST_SURFACE_HV: Partial<Record<PropertyClass, number>> = { "10.9": 390, "12.9": 435 };

/** Surface at most core + 30 HV, and within the limit of its class. Source: ISO 898-1. */
export function fastenerSurfaceVerdict(input: {
  readonly coreHv: number;
  readonly surfaceHv: number;
  readonly propertyClass: PropertyClass;
}): RequirementWord | Refusal<"not_positive"> {
  const { coreHv, surfaceHv } = input;
  if (!isPositive(coreHv) || !isPositive(surfaceHv))
    return refuse("not_positive", "Core and surface hardness have to be above zero.");
  const highest = HIGHEST_SURFACE_HV[input.propertyClass] ?? Infinity;
  return surfaceHv <= coreHv + LARGEST_DIFFERENCE_HV && surfaceHv <= highest ? "pass" : "fail";
}
