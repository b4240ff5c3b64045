import "server-only";
import { eq } from "drizzle-orm";
import { database, type Transaction } from "@/db/client";
import { cases, fieldReturns, people } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import type { Action } from "@/lib/auth/policy";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import type { Answers } from "@/lib/intake/answers";
import { changedFields } from "@/lib/intake/open-answers";
import { loadAnswers } from "./load-answers";
import { partColumns } from "./part-columns";
import { SaveDraftInput } from "./schemas";
import { writeCase } from "./write-case";

export type SavedDraft = { revision: number; savedAt: string };

/** Before sending, the sender fills it in; while a question is open, whoever may answer does. */
async function actionFor(caseId: string): Promise<Action> {
  const [row] = await database()
    .select({ state: cases.state })
    .from(cases)
    .where(eq(cases.id, caseId));
  return row?.state === "info_needed" ? "case.answer" : "case.editDraft";
}

/**
 * Keeps the field return as typed, right or wrong.
 * @throws AppError CONFLICT with both states when someone saved since `revision`
 */
export async function saveDraft(actor: Actor, raw: unknown): Promise<SavedDraft> {
  const input = parseInput(SaveDraftInput, raw);
  const action = await actionFor(input.caseId);
  return writeCase(actor, action, input.caseId, async (tx, { row }) => {
    const draft = await loadAnswers(tx, input.caseId, "lock");
    if (draft.revision !== input.revision) throw await conflict(tx, draft, input.answers);
    const changed = changedFields(draft.answers, input.answers);
    if (changed.length === 0) {
      return { revision: draft.revision, savedAt: draft.savedAt.toISOString() };
    }
    const revision = draft.revision + 1;
    const savedAt = new Date();
    await tx
      .update(fieldReturns)
      .set({ answers: input.answers, revision, savedById: actor.id, savedAt })
      .where(eq(fieldReturns.caseId, input.caseId));
    if (row.state === "draft") {
      await tx.update(cases).set(partColumns(input.answers)).where(eq(cases.id, input.caseId));
    }
    const only = (answers: Answers) =>
      Object.fromEntries(changed.map(({ key }) => [key, answers[key] ?? null]));
    await recordEvent(tx, {
      caseId: input.caseId,
      actor,
      action,
      subject: { kind: "field_return", id: input.caseId, label: row.number ?? "Draft" },
      before: { revision: draft.revision, answers: only(draft.answers) },
      after: { revision, answers: only(input.answers) },
    });
    return { revision, savedAt: savedAt.toISOString() };
  });
}

async function conflict(
  tx: Transaction,
  draft: Awaited<ReturnType<typeof loadAnswers>>,
  yours: Answers,
): Promise<AppError> {
  const [by] = draft.savedById
    ? await tx.select({ name: people.name }).from(people).where(eq(people.id, draft.savedById))
    : [];
  const changedBy = by?.name ?? "Someone";
  return new AppError(
    "CONFLICT",
    `The field return was not saved. ${changedBy} changed it since you opened it. Yours is kept here; compare the two.`,
    {
      conflict: {
        yours: { answers: yours },
        theirs: { answers: draft.answers, revision: draft.revision },
        changedBy,
        changedAt: draft.savedAt.toISOString(),
      },
    },
  );
}
