import "server-only";
import { eq } from "drizzle-orm";
import { people, reportIssues, reportRevisions } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { canonicalJson, sha256Hex } from "@/lib/canonical-json";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { bindCitations } from "./bind-citations";
import { type CitedState, citedStates } from "./cited-states";
import type { DocumentNode } from "./document";
import { SaveFindingsInput } from "./document-schema";
import { findIssue } from "./find-issue";

export type SavedFindings = {
  revision: number;
  savedAt: string;
  document: DocumentNode;
  cited: CitedState[];
};

/**
 * Saves the draft, if nobody else saved since the revision this person saw.
 * @throws AppError CONFLICT with both texts; INVALID when a part of the text is not allowed
 */
export async function saveFindings(actor: Actor, raw: unknown): Promise<SavedFindings> {
  const input = parseInput(SaveFindingsInput, raw);
  return writeCase(actor, "findings.write", input.caseId, async (tx) => {
    const issue = await findIssue(tx, input.caseId, "lock");
    if (!issue || issue.signedAt !== null)
      throw new AppError("LOCKED", "There is no open issue to write in.");
    const document = await bindCitations(tx, input.caseId, input.document);
    if (issue.revision !== input.revision) {
      const [other] = issue.savedById
        ? await tx.select({ name: people.name }).from(people).where(eq(people.id, issue.savedById))
        : [];
      throw new AppError(
        "CONFLICT",
        `Findings were not saved. ${other?.name ?? "Someone"} saved after you opened them. Your text is kept here; compare the two.`,
        {
          conflict: {
            yours: { document, rootCause: input.rootCause },
            theirs: {
              document: issue.document,
              rootCause: issue.rootCause ?? "",
              revision: issue.revision,
            },
            changedBy: other?.name ?? "Someone",
            changedAt: issue.savedAt.toISOString(),
          },
        },
      );
    }
    const savedAt = new Date();
    const revision = issue.revision + 1;
    await tx
      .update(reportIssues)
      .set({ document, rootCause: input.rootCause || null, revision, savedById: actor.id, savedAt })
      .where(eq(reportIssues.id, issue.id));
    await tx
      .insert(reportRevisions)
      .values({ issueId: issue.id, revision, document, savedById: actor.id, savedAt });
    const digest = (text: unknown) => sha256Hex(canonicalJson(text));
    await recordEvent(tx, {
      caseId: input.caseId,
      actor,
      action: "findings.write",
      subject: { kind: "report_issue", id: issue.id, label: `Findings, issue ${issue.number}` },
      before: {
        revision: issue.revision,
        sha256: digest(issue.document),
        rootCause: issue.rootCause,
      },
      after: { revision, sha256: digest(document), rootCause: input.rootCause || null },
    });
    return {
      revision,
      savedAt: savedAt.toISOString(),
      document,
      cited: await citedStates(tx, document),
    };
  });
}
