import { z } from "zod";
import { PASSWORD_MAX_LENGTH } from "@/lib/people/constants";

const caseId = z.string().max(40);

export const SignReportInput = z.object({
  caseId,
  /** Digest of the text that was on screen. */
  documentSha256: z.string().length(64),
  hasRead: z.boolean().refine((said) => said, "Say that you have read all of it."),
  hasNotMeasured: z.boolean().refine((said) => said, "Say that you did not make the measurements."),
  password: z.string().min(1, "Type your password.").max(PASSWORD_MAX_LENGTH),
});

export const OpenNewIssueInput = z.object({
  caseId,
  reason: z
    .string()
    .trim()
    .min(5, "Say why a new issue is needed; it is printed in the report.")
    .max(1000),
});
