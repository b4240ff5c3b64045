import "server-only";
import { and, eq, lt } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { people, reportIssues } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import { moveCase } from "@/lib/cases/move-case";
import { findCase } from "@/lib/cases/subject";
import { touchCase } from "@/lib/cases/write-case";
import { queueMail } from "@/lib/outbox/mail";
import { routes } from "@/lib/routes";

/** Releases a stored issue: earlier ones are replaced, and requester and signer get a mail. */
export async function releaseIssue(
  tx: Transaction,
  issue: typeof reportIssues.$inferSelect,
  stored: { objectId: string; sha256: string; pdfKey: string },
): Promise<void> {
  const loaded = await findCase(tx, issue.caseId, "lock");
  if (!loaded) throw new Error(`case ${issue.caseId} of issue ${issue.id} is gone`);
  const { row } = loaded;
  await tx
    .update(reportIssues)
    .set({ state: "superseded" })
    .where(
      and(
        eq(reportIssues.caseId, row.id),
        lt(reportIssues.number, issue.number),
        eq(reportIssues.state, "released"),
      ),
    );
  await tx
    .update(reportIssues)
    .set({ state: "released", releasedAt: new Date(), pdfObjectId: stored.objectId })
    .where(eq(reportIssues.id, issue.id));
  await recordEvent(tx, {
    caseId: row.id,
    actor: null,
    action: "system.storeReport",
    subject: { kind: "report_issue", id: issue.id, label: `Report, issue ${issue.number}` },
    before: null,
    after: { pdfSha256: stored.sha256, manifestSha256: issue.manifestSha256 },
  });
  await moveCase(tx, null, row, "release");
  await touchCase(tx, row.id);
  for (const personId of new Set([row.requesterId, row.leadId, row.investigatorId])) {
    if (personId === null) continue;
    const [person] = await tx
      .select({ email: people.email })
      .from(people)
      .where(eq(people.id, personId));
    if (!person) continue;
    await queueMail(
      tx,
      {
        to: person.email,
        subject: `${row.number}: report signed, ${row.title}`,
        news:
          issue.number > 1
            ? `Issue ${issue.number} of the findings report is signed. It replaces the earlier issue; do not use that one any more.`
            : "The findings report is signed.",
        facts: [
          ["Case", `${row.number} ${row.title}`],
          ["Root cause", issue.rootCause ?? ""],
          ["Issue", String(issue.number)],
          ["SHA-256 of the PDF", stored.sha256],
        ],
        button: { label: "Read the report", path: routes.report(row.id) },
        after:
          "Findings rest on the pieces examined. Do not return a part, sister part or fleet to service on this alone; that decision belongs to the responsible engineer and the rules that apply.",
      },
      `released:${issue.id}:${personId}`,
    );
  }
}
