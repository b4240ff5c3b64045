import "server-only";
import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { cases, records, recordVersions } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { parseInput } from "@/lib/http/parse-input";
import { changedFields } from "@/lib/intake/open-answers";
import { fieldReturnQuotes } from "@/lib/intake/quotes";
import { fieldReturnContent, sentAnswers } from "@/lib/intake/schemas";
import { addVersion } from "@/lib/records/write-version";
import { loadAnswers } from "./load-answers";
import { partColumns } from "./part-columns";

/**
 * Makes the next version of F1 from what was typed since it was sent. Null where nothing changed.
 * @throws AppError INVALID with one sentence for each field that does not hold
 */
export async function restateFieldReturn(
  tx: Transaction,
  actor: Actor,
  caseId: string,
): Promise<number | null> {
  const [latest] = await tx
    .select({
      recordId: records.id,
      label: records.label,
      number: recordVersions.number,
      content: recordVersions.content,
    })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(and(eq(records.caseId, caseId), eq(records.kind, "field_return")));
  if (!latest) throw new Error(`case ${caseId} was sent without a field return`);
  const before = fieldReturnContent.parse(latest.content).answers;
  const draft = await loadAnswers(tx, caseId, "lock");
  const changed = changedFields(before, draft.answers);
  if (changed.length === 0) return null;
  const answers = parseInput(sentAnswers(new Date(), false), draft.answers);
  const written = await addVersion(tx, actor, latest.recordId, latest.number, {
    content: { answers },
    quotes: fieldReturnQuotes(answers),
    reason: "Changed while answering the laboratory's questions",
  });
  await tx.update(cases).set(partColumns(answers)).where(eq(cases.id, caseId));
  const only = (all: typeof answers) =>
    Object.fromEntries(changed.map(({ key }) => [key, all[key] ?? null]));
  await recordEvent(tx, {
    caseId,
    actor,
    action: "case.answer",
    subject: { kind: "field_return", id: latest.recordId, label: latest.label },
    before: { version: latest.number, answers: only(before) },
    after: { version: written.number, answers: only(answers) },
  });
  return written.number;
}
