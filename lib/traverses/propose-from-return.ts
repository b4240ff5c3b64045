import { proposedDepthKind } from "@/lib/hardness/depth-limits";
import type { Scale } from "@/lib/hardness/scales";
import type { Answers } from "@/lib/intake/answers";
import { drawingRequirement, type StatedHardness } from "@/lib/intake/requirement";
import type { TraverseContent } from "./schemas";

/** What the field return says of a traverse: the process and what the drawing asks. */
export type TraverseProposal = Pick<
  TraverseContent,
  | "process"
  | "depthKind"
  | "minSurfaceHv"
  | "requiredDepthMm"
  | "requiredSurface"
  | "requiredCore"
  | "isRequirementFromReturn"
>;

export const NO_PROPOSAL: TraverseProposal = {
  process: "none",
  depthKind: "none",
  minSurfaceHv: null,
  requiredDepthMm: null,
  requiredSurface: null,
  requiredCore: null,
  isRequirementFromReturn: false,
};

/** "HV1" and "HBW 2.5/187.5" without the load. */
function scaleOf(stated: string): Scale | null {
  if (stated.startsWith("HV")) return "HV";
  if (stated.startsWith("HK")) return "HK";
  if (stated.startsWith("HBW")) return "HBW_3000";
  const rockwell = ["HRC", "HRB", "HRA", "HRD", "HR15N", "HR30N", "HR45N"] as const;
  return rockwell.find((scale) => scale === stated) ?? null;
}

function required(stated: StatedHardness | null): TraverseContent["requiredSurface"] {
  const scale = stated && scaleOf(stated.scale);
  if (!stated || !scale || (stated.min === null && stated.max === null)) return null;
  return { scale, min: stated.min, max: stated.max };
}

export function proposeFromReturn(answers: Answers): TraverseProposal {
  const asked = drawingRequirement(answers);
  const process = asked.caseDepth?.process ?? "none";
  const requiredSurface = required(asked.surfaceHardness);
  const requiredCore = required(asked.coreHardness);
  const stated = asked.caseDepth;
  const requiredDepthMm =
    stated && stated.definition !== "total" && (stated.minMm !== null || stated.maxMm !== null)
      ? { min: stated.minMm, max: stated.maxMm }
      : null;
  return {
    process,
    depthKind: proposedDepthKind(process),
    minSurfaceHv: requiredSurface?.scale === "HV" ? requiredSurface.min : null,
    requiredDepthMm,
    requiredSurface,
    requiredCore,
    isRequirementFromReturn:
      process !== "none" ||
      requiredSurface !== null ||
      requiredCore !== null ||
      requiredDepthMm !== null,
  };
}
