import "server-only";
import { and, eq } from "drizzle-orm";
import { cases, people, reportIssues } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { type CaseSubject, roleMay } from "@/lib/auth/policy";
import { moveCase } from "@/lib/cases/move-case";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { queueMail } from "@/lib/outbox/mail";
import { routes } from "@/lib/routes";
import { findIssue } from "./find-issue";
import { SendToSecondReaderInput } from "./move-schemas";
import { plainTextOf } from "./document";

/** Why someone cannot be the second reader; null when they can. */
export function readerProblem(reader: Actor | null, subject: CaseSubject): string | null {
  if (!reader || !roleMay(reader, "findings.recordReading"))
    return "Choose someone who can read findings.";
  if (subject.investigatorId === reader.id || subject.authorIds.includes(reader.id))
    return "They wrote part of it. Choose someone else.";
  if (subject.leadId === reader.id) return "They sign the report. Choose someone else.";
  return null;
}

/** Sends the findings to the second reader, who is neither author nor signer. */
export async function sendToSecondReader(actor: Actor, raw: unknown): Promise<void> {
  const input = parseInput(SendToSecondReaderInput, raw);
  await writeCase(
    actor,
    "findings.sendToSecondReader",
    input.caseId,
    async (tx, { row, subject }) => {
      const issue = await findIssue(tx, input.caseId, "lock");
      if (!issue || plainTextOf(issue.document) === "") {
        throw new AppError(
          "INVALID",
          "Nothing is written yet. Nothing was sent. Write the findings first.",
        );
      }
      const [person] = await tx
        .select()
        .from(people)
        .where(and(eq(people.id, input.readerId), eq(people.isActive, true)));
      const problem = readerProblem(
        person ? { ...person, organisationName: "", organisationKind: "laboratory" } : null,
        subject,
      );
      if (problem || !person)
        throw new AppError("INVALID", undefined, {
          fields: { readerId: problem ?? "Choose a person." },
        });
      await tx.update(cases).set({ secondReaderId: person.id }).where(eq(cases.id, row.id));
      await tx
        .update(reportIssues)
        .set({ state: "peer_review" })
        .where(eq(reportIssues.id, issue.id));
      await moveCase(tx, actor, row, "sendToSecondReader", { secondReaderId: person.id }, null, {
        revision: issue.revision,
      });
      await queueMail(tx, {
        to: person.email,
        subject: `${row.number}: findings to read, ${row.title}`,
        news: `${actor.name} asks you to read the findings as second reader.`,
        facts: [["Case", `${row.number} ${row.title}`]],
        button: { label: "Read the findings", path: routes.signOff(row.id) },
      });
    },
  );
}
