import "server-only";
import { and, eq, ne } from "drizzle-orm";
import { records, reportIssues } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { documentDigest } from "@/lib/cases/gates";
import { moveCase } from "@/lib/cases/move-case";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { LABEL_PREFIX } from "@/lib/records/constants";
import { setVoid } from "@/lib/records/void-record";
import { createRecord, nextLabel } from "@/lib/records/write-version";
import { mailInvestigator } from "./mail-investigator";
import { findIssue } from "./find-issue";
import { countOpenNotes } from "./list-notes";
import { RecordReadingInput } from "./move-schemas";
import type { ReadingContent } from "./reading-schema";

/**
 * Records the second reading of the text as it stands: read, or sent back with a note. Only the
 * person named as second reader does it.
 * @throws AppError CONFLICT when the text changed since the reader opened it
 */
export async function recordReading(actor: Actor, raw: unknown): Promise<{ label: string }> {
  const input = parseInput(RecordReadingInput, raw);
  return writeCase(actor, "findings.recordReading", input.caseId, async (tx, { row }) => {
    const issue = await findIssue(tx, input.caseId, "lock");
    if (!issue) throw new AppError("LOCKED", "There is no open issue to read.");
    if (issue.revision !== input.revision) {
      throw new AppError(
        "CONFLICT",
        "The findings changed since you opened them. Your reading was not recorded; your note is kept here. Read them again.",
      );
    }
    const earlier = await tx
      .select({ id: records.id })
      .from(records)
      .where(
        and(
          eq(records.caseId, row.id),
          eq(records.kind, "second_reading"),
          ne(records.state, "void"),
        ),
      );
    for (const reading of earlier)
      await setVoid(tx, reading.id, { isVoid: true, reason: "Read again" });
    const content: ReadingContent = {
      issueId: issue.id,
      readerId: actor.id,
      revision: issue.revision,
      documentSha256: documentDigest(issue.document),
      verdict: input.verdict,
      note: input.note,
    };
    const label = await nextLabel(tx, row.id, LABEL_PREFIX.second_reading);
    const written = await createRecord(
      tx,
      actor,
      { caseId: row.id, kind: "second_reading", label },
      { content },
    );
    await recordEvent(tx, {
      caseId: row.id,
      actor,
      action: "findings.recordReading",
      subject: { kind: "second_reading", id: written.recordId, label },
      before: null,
      after: content,
    });
    if (input.verdict === "sent_back") {
      await tx.update(reportIssues).set({ state: "drafting" }).where(eq(reportIssues.id, issue.id));
      await moveCase(tx, actor, row, "sendBack", {}, input.note);
    }
    const did = input.verdict === "read" ? "has read the findings" : "sent the findings back";
    const openNotes = await countOpenNotes(tx, issue.id);
    const beside =
      openNotes === 0
        ? ""
        : openNotes === 1
          ? " 1 note beside the text waits for your answer."
          : ` ${openNotes} notes beside the text wait for your answer.`;
    await mailInvestigator(tx, row, `${actor.name} ${did}.${beside}`, input.note);
    return { label };
  });
}
