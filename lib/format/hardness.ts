import {
  formatNumber,
  formatWithUncertainty,
  unitText,
  type MaybeNumber,
} from "@/lib/format/numbers";
import { DASH, NO_BREAK_SPACE } from "@/lib/format/marks";

export interface HardnessShown {
  value: MaybeNumber;
  /** Scale with its load: "HV1", "HRC", "HBW 2.5/187.5". */
  scale: string;
  /** Expanded uncertainty, in the same scale. */
  uncertainty?: MaybeNumber;
  /** Where it was converted: the sign ≈ goes before it. */
  converted?: boolean;
}

/**
 * "632 ± 17 HV1", "≈ 56.9 HRC". Without an uncertainty Rockwell is shown to a tenth, and Vickers,
 * Brinell and Knoop to three figures below 100 and whole from there (common practice).
 */
export function formatHardness({ value, scale, uncertainty, converted }: HardnessShown): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return DASH;
  const sign = converted ? `≈${NO_BREAK_SPACE}` : "";
  if (uncertainty) return sign + formatWithUncertainty(value, uncertainty, scale);
  const shape = scale.startsWith("HR")
    ? { decimals: 1 }
    : value < 100
      ? { figures: 3 }
      : { decimals: 0 };
  return sign + formatNumber(value, shape) + unitText(scale);
}
