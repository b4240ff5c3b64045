import { z } from "zod";

/** Content of a second reading: which state of which issue was read, and what the reader says. */
export const readingContent = z.object({
  issueId: z.string(),
  readerId: z.string(),
  revision: z.number().int(),
  documentSha256: z.string(),
  verdict: z.enum(["read", "sent_back"]),
  note: z.string().max(4000),
});
export type ReadingContent = z.infer<typeof readingContent>;
