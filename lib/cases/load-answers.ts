import "server-only";
import { eq } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { fieldReturns } from "@/db/schema";
import { notFound } from "@/lib/errors";
import type { Answers } from "@/lib/intake/answers";
import { draftAnswers } from "@/lib/intake/schemas";

export type LoadedAnswers = {
  answers: Answers;
  revision: number;
  savedById: string | null;
  savedAt: Date;
};

/** The field return as it is being typed. `lock` holds it to the end of the transaction. */
export async function loadAnswers(
  reader: Reader,
  caseId: string,
  lock: "lock" | "read" = "read",
): Promise<LoadedAnswers> {
  const query = reader.select().from(fieldReturns).where(eq(fieldReturns.caseId, caseId));
  const [row] = lock === "lock" ? await query.for("update") : await query;
  if (!row) throw notFound();
  return {
    answers: draftAnswers.parse(row.answers),
    revision: row.revision,
    savedById: row.savedById,
    savedAt: row.savedAt,
  };
}
