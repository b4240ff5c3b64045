import "server-only";
import { eq } from "drizzle-orm";
import { people, reportIssues } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { gateLedger } from "@/lib/cases/gates";
import { moveCase } from "@/lib/cases/move-case";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { queueMail } from "@/lib/outbox/mail";
import { routes } from "@/lib/routes";
import { findIssue } from "./find-issue";
import { SendForSignOffInput } from "./move-schemas";

/**
 * Sends the findings for sign-off; all eight gates have to be met, as they stand inside the
 * transaction, and the root cause has to be written.
 * @throws AppError INVALID naming each open gate
 */
export async function sendForSignOff(actor: Actor, raw: unknown): Promise<void> {
  const input = parseInput(SendForSignOffInput, raw);
  await writeCase(actor, "findings.sendForSignOff", input.caseId, async (tx, { row }) => {
    const issue = await findIssue(tx, input.caseId, "lock");
    if (!issue) throw new AppError("LOCKED", "There is no open issue to send.");
    const open = (await gateLedger(tx, row.id)).filter((gate) => !gate.isMet);
    if (open.length > 0) {
      throw new AppError(
        "INVALID",
        `Not sent. Still open: ${open.map((gate) => `${gate.title} (${gate.detail})`).join("; ")}.`,
      );
    }
    if (!issue.rootCause) {
      throw new AppError(
        "INVALID",
        "Not sent. Write the root cause in one sentence at the head of the findings.",
      );
    }
    await tx.update(reportIssues).set({ state: "approval" }).where(eq(reportIssues.id, issue.id));
    await moveCase(tx, actor, row, "sendForSignOff", {}, null, {
      revision: issue.revision,
      rootCause: issue.rootCause,
    });
    const [lead] = row.leadId
      ? await tx.select({ email: people.email }).from(people).where(eq(people.id, row.leadId))
      : [];
    if (lead) {
      await queueMail(tx, {
        to: lead.email,
        subject: `${row.number}: findings wait for your signature, ${row.title}`,
        news: `${actor.name} sent the findings for sign-off.`,
        facts: [["Root cause", issue.rootCause]],
        button: { label: "Read and sign", path: routes.signOff(row.id) },
      });
    }
  });
}
