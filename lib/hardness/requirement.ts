import { numberText, quantityText } from "../numerics/number-text";
import type { Refusal } from "../numerics/verdict";
import { SCALES, type Scale } from "./scales";
import type { CaseDepth } from "./case-depth";
import type { DepthRequirement, HardnessRequirement } from "./traverse-input";

export interface RequirementVerdict {
  readonly word: "pass" | "fail" | "cannot_be_decided";
  readonly reason: string;
  /** A limit lies within the expanded uncertainty of the value; the word stays as it is. */
  readonly isWithinUncertainty: boolean;
}

interface Bounds {
  readonly min?: number;
  readonly max?: number;
}

/** Last binary digits of an interpolated value, far below anything that is measured. */
const TOLERANCE = 1e-9;

function verdict(
  word: RequirementVerdict["word"],
  reason: string,
  isWithinUncertainty = false,
): RequirementVerdict {
  return { word, reason, isWithinUncertainty };
}

function boundsText({ min, max }: Bounds, decimals: number, unit: string): string {
  if (min !== undefined && max !== undefined)
    return `Required ${numberText(min, decimals)} to ${quantityText(max, decimals, unit)}.`;
  if (min !== undefined) return `Required at least ${quantityText(min, decimals, unit)}.`;
  return `Required at most ${quantityText(max ?? NaN, decimals, unit)}.`;
}

function judge(value: number, bounds: Bounds, uncertainty: number | null, text: string) {
  const { min = -Infinity, max = Infinity } = bounds;
  const isInside = value >= min - TOLERANCE && value <= max + TOLERANCE;
  const u = uncertainty ?? 0;
  const isNear = Math.abs(value - min) < u || Math.abs(value - max) < u;
  return verdict(isInside ? "pass" : "fail", text, isNear);
}

const isStated = (bounds: Bounds | undefined): bounds is Bounds =>
  bounds !== undefined && (bounds.min !== undefined || bounds.max !== undefined);

/**
 * A hardness against its requirement; `null` when nothing is required. A requirement in another
 * scale than the one measured is not decided: a converted value never replaces a measured one.
 */
export function hardnessVerdict(
  required: HardnessRequirement | undefined,
  measured: {
    readonly value: number;
    readonly scale: Scale;
    readonly uncertainty: number | null;
  } | null,
): RequirementVerdict | null {
  if (!required || !isStated(required)) return null;
  const unit = SCALES[required.scale].symbol;
  const text = boundsText(required, Number.isInteger(required.min ?? required.max) ? 0 : 1, unit);
  if (!measured) return verdict("cannot_be_decided", `${text} There is no value to compare.`);
  if (measured.scale !== required.scale)
    return verdict(
      "cannot_be_decided",
      `${text} It was measured in ${SCALES[measured.scale].symbol}: measure in ${unit}, or agree on a limit in ${SCALES[measured.scale].symbol}.`,
    );
  return judge(measured.value, required, measured.uncertainty, text);
}

/** A case depth against its requirement, mm; `null` when nothing is required. */
export function depthVerdict(
  required: DepthRequirement | undefined,
  depth: CaseDepth | Refusal,
  uncertaintyMm: number | null,
  shallowestMm: number | null,
): RequirementVerdict | null {
  if (!isStated(required)) return null;
  const { min, max } = required;
  const text = boundsText(required, 2, "mm");
  if (depth.verdict === "ok" || depth.verdict === "warn")
    return judge(depth.depthMm, required, uncertaintyMm, text);
  if (depth.verdict === "beyond_last_reading") {
    const { deepestMm } = depth;
    if (max !== undefined && deepestMm > max) return verdict("fail", text);
    if (max === undefined && min !== undefined && deepestMm >= min) return verdict("pass", text);
    return verdict("cannot_be_decided", `${text} The traverse ends too early.`);
  }
  if (depth.verdict === "not_reached") {
    const isShallowerThanRequired = min !== undefined && (shallowestMm ?? Infinity) <= min;
    return isShallowerThanRequired
      ? verdict("fail", `${text} The limit is not reached even nearer the surface.`)
      : verdict("cannot_be_decided", `${text} No reading reaches the limit.`);
  }
  return verdict("cannot_be_decided", `${text} There is no depth to compare.`);
}
