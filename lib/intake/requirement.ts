import { HARDENING_PROCESSES, type HardeningProcess } from "@/lib/traverses/constants";
import { type Answer, type Answers, valueAs } from "./answers";
import { DEPTH_DEFINITIONS, type DepthDefinition } from "./constants";
import { oneNumber } from "./one-number";

export type StatedRange = { min: number | null; max: number | null };
export type StatedHardness = StatedRange & { scale: string; location: string };
export type StatedDepth = {
  process: HardeningProcess | null;
  definition: DepthDefinition;
  minMm: number | null;
  maxMm: number | null;
};
export type DrawingRequirement = {
  grade: string | null;
  condition: string | null;
  tensileStrengthMPa: StatedRange | null;
  surfaceHardness: StatedHardness | null;
  coreHardness: StatedHardness | null;
  caseDepth: StatedDepth | null;
};

const numberOrNull = (typed: string, unit = "") => {
  const read = oneNumber(typed, unit);
  return read.ok ? read.value : null;
};

const textOrNull = (answer: Answer | undefined) => valueAs("text", answer).trim() || null;

function statedHardness(answer: Answer | undefined): StatedHardness | null {
  const { scale, min, max, location } = valueAs("hardness", answer);
  return scale === ""
    ? null
    : { scale, location, min: numberOrNull(min, scale), max: numberOrNull(max, scale) };
}

/** What the drawing asks for, as numbers; null where the field return does not say. */
export function drawingRequirement(answers: Answers): DrawingRequirement {
  const tensile = valueAs("range", answers.tensileStrengthMPa);
  const min = numberOrNull(tensile.min, "MPa");
  const max = numberOrNull(tensile.max, "MPa");
  const depth = valueAs("caseDepth", answers.caseDepth);
  const definition = DEPTH_DEFINITIONS.find((name) => name === depth.definition);
  return {
    grade: textOrNull(answers.grade),
    condition: textOrNull(answers.condition),
    tensileStrengthMPa: min === null && max === null ? null : { min, max },
    surfaceHardness: statedHardness(answers.surfaceHardness),
    coreHardness: statedHardness(answers.coreHardness),
    caseDepth: definition
      ? {
          process: HARDENING_PROCESSES.find((name) => name === depth.process) ?? null,
          definition,
          minMm: numberOrNull(depth.min, "mm"),
          maxMm: numberOrNull(depth.max, "mm"),
        }
      : null,
  };
}
