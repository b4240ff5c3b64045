import { z } from "zod";
import { STRENGTH_VERDICTS } from "./constants";

export const STRENGTH_REASON_MAX = 2000;

/** Content of a strength statement: a verdict and why. */
export const strengthContent = z.object({
  verdict: z.enum(STRENGTH_VERDICTS),
  reason: z.string().trim().min(1, "Say why.").max(STRENGTH_REASON_MAX),
});
export type StrengthContent = z.infer<typeof strengthContent>;

export const StateStrengthInput = strengthContent.extend({
  caseId: z.string(),
  /** Null for the first statement. */
  seenVersion: z.number().int().nullable(),
});
