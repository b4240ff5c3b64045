import "server-only";
import { and, eq } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { records, recordVersions } from "@/db/schema";
import { openAnswers } from "@/lib/intake/open-answers";
import { fieldReturnContent } from "@/lib/intake/schemas";

/** What nobody knew at intake, each with the reason, for the limitations of the report. */
export async function openQuestions(reader: Reader, caseId: string): Promise<string[]> {
  const [row] = await reader
    .select({ content: recordVersions.content })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(and(eq(records.caseId, caseId), eq(records.kind, "field_return")));
  if (!row) return [];
  const { answers } = fieldReturnContent.parse(row.content);
  return openAnswers(answers).map(({ field, answer }) => {
    if (answer.kind === "unknown") return `${field.label}: not known. ${answer.why}`;
    return `${field.label}: ${answer.kind === "awaiting" ? "asked, no answer yet" : "does not apply"}.`;
  });
}
