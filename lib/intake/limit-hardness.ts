import { CHD_LIMIT_HV, NHD_OFFSET_HV, SHD_FRACTION, shdLimitHv } from "@/lib/hardness/depth-limits";
import { type Answers, valueAs } from "./answers";
import { oneNumber } from "./one-number";

export type LimitHardness = {
  /** HV; null where it cannot be worked out from the field return. */
  limitHv: number | null;
  scale: string;
  rule: string;
};

/** Share in whole percent, as the rule is worded. */
const SHD_PERCENT = Math.round(SHD_FRACTION * 100);

/**
 * Limit hardness of the stated case depth (ISO 18203): 80 % of the least surface hardness for SHD,
 * 550 HV1 for CHD, core plus 50 HV for NHD. Null where no case depth with a limit is stated.
 */
export function limitHardness(answers: Answers): LimitHardness | null {
  const { definition } = valueAs("caseDepth", answers.caseDepth);
  switch (definition) {
    case "SHD": {
      const surface = valueAs("hardness", answers.surfaceHardness);
      const least = oneNumber(surface.min);
      if (!surface.scale.startsWith("HV") || !least.ok) {
        return {
          limitHv: null,
          scale: "HV1",
          rule: `${SHD_PERCENT} % of the least surface hardness, which has to be stated in HV (ISO 18203)`,
        };
      }
      return {
        limitHv: shdLimitHv(least.value),
        scale: surface.scale,
        rule: `${SHD_PERCENT} % of ${least.value} ${surface.scale} (ISO 18203)`,
      };
    }
    case "CHD":
      return { limitHv: CHD_LIMIT_HV, scale: "HV1", rule: "Fixed for CHD (ISO 18203)" };
    case "NHD":
      return {
        limitHv: null,
        scale: "HV0.5",
        rule: `Core hardness as measured plus ${NHD_OFFSET_HV} HV (ISO 18203)`,
      };
    default:
      return null;
  }
}
