import { z } from "zod";

const caseId = z.string().max(40);
const note = z.string().trim().max(4000, "Use at most 4000 characters.");

export const SendToSecondReaderInput = z.object({
  caseId,
  readerId: z.string().min(1, "Choose a person.").max(40),
});

export const RecordReadingInput = z
  .object({ caseId, verdict: z.enum(["read", "sent_back"]), note, revision: z.number().int() })
  .refine((input) => input.verdict === "read" || input.note !== "", {
    path: ["note"],
    error: "Say what has to change.",
  });

export const SendForSignOffInput = z.object({ caseId });
export const SendBackInput = z.object({ caseId, note: note.min(1, "Say what has to change.") });
