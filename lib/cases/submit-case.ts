import "server-only";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { packingAdvice } from "@/lib/intake/packing-advice";
import { fieldReturnQuotes } from "@/lib/intake/quotes";
import { sentAnswers } from "@/lib/intake/schemas";
import { LABEL_PREFIX } from "@/lib/records/constants";
import { createRecord, nextLabel } from "@/lib/records/write-version";
import { routes } from "@/lib/routes";
import { mailAboutCase, recipients, triagePeople } from "./case-mail";
import { nextCaseNumber } from "./case-number";
import { loadAnswers } from "./load-answers";
import { moveCase } from "./move-case";
import { partColumns } from "./part-columns";
import { SubmitCaseInput } from "./schemas";
import { writeCase } from "./write-case";

export type SubmittedCase = { caseId: string; number: string };

/**
 * Sends a field return to the laboratory: checks every answer, gives the case its number, keeps
 * what was said as F1, and mails the sender and those who can accept it.
 * @throws AppError INVALID with one sentence for each field; CONFLICT when the draft was saved since
 */
export async function submitCase(actor: Actor, raw: unknown): Promise<SubmittedCase> {
  const input = parseInput(SubmitCaseInput, raw);
  return writeCase(actor, "case.submit", input.caseId, async (tx, { row }) => {
    const draft = await loadAnswers(tx, row.id, "lock");
    if (draft.revision !== input.revision) {
      throw new AppError(
        "CONFLICT",
        "The field return changed since this page saved it. Nothing was sent. Look at it again.",
      );
    }
    const now = new Date();
    const answers = parseInput(sentAnswers(now, true), draft.answers);
    const number = await nextCaseNumber(tx, now);
    const columns = partColumns(answers);
    await moveCase(tx, actor, row, "submit", { number, submittedAt: now, ...columns });
    const label = await nextLabel(tx, row.id, LABEL_PREFIX.field_return);
    const quotes = fieldReturnQuotes(answers);
    const written = await createRecord(
      tx,
      actor,
      { caseId: row.id, kind: "field_return", label },
      { content: { answers }, quotes },
    );
    await recordEvent(tx, {
      caseId: row.id,
      actor,
      action: "case.submit",
      subject: { kind: "field_return", id: written.recordId, label },
      before: null,
      after: { version: written.number, answers },
    });
    const numbered = { ...row, ...columns, number };
    const requester = await recipients(tx, [row.requesterId]);
    await mailAboutCase(tx, requester, numbered, "field return received", {
      news: `Your field return has reached the laboratory as ${number}. Write the number on the box.`,
      button: { label: "Open the field return", path: routes.fieldReturn(row.id) },
      after: `Before you pack:\n${packingAdvice(answers).join("\n")}`,
    });
    const sentTo = new Set(requester.map((person) => person.id));
    const triage = (await triagePeople(tx)).filter((person) => !sentTo.has(person.id));
    await mailAboutCase(tx, triage, numbered, "new field return", {
      news: `${actor.name}, ${actor.organisationName}, sent a field return. It waits to be accepted.`,
    });
    return { caseId: row.id, number };
  });
}
