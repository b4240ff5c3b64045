import { z } from "zod";
import { MECHANISM_CODES, MECHANISM_VERDICTS, type MechanismCode } from "./constants";

const codes = Object.keys(MECHANISM_CODES) as [MechanismCode, ...MechanismCode[]];

/** Content of one mechanism on the list: what it is, where it stands and why. */
export const mechanismContent = z
  .object({
    code: z.enum(codes),
    /** What this mechanism would mean in this case, e.g. "fatigue, at fillet". */
    detail: z.string().trim().max(120),
    verdict: z.enum(MECHANISM_VERDICTS),
    reason: z.string().trim().max(2000),
  })
  .refine((content) => content.verdict === "open" || content.reason !== "", {
    path: ["reason"],
    error: "Say why.",
  });
export type MechanismContent = z.infer<typeof mechanismContent>;

export const WeighMechanismInput = z.object({
  caseId: z.string(),
  /** Null adds a mechanism. */
  recordId: z.string().nullable(),
  seenVersion: z.number().int().nullable(),
  content: mechanismContent,
});

export const WithdrawMechanismInput = z.object({
  caseId: z.string(),
  recordId: z.string(),
  reason: z.string().trim().min(1, "Say why.").max(500),
});
