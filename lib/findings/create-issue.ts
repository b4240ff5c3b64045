import "server-only";
import { eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { reportIssues } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { newId } from "@/lib/new-id";
import type { DocumentNode } from "./document";
import { startingDocument } from "./starting-document";

/**
 * Opens issue 1 of the findings when a case is accepted; a case that has one keeps it. Nobody is
 * its author yet: that is who writes in it.
 */
export async function createFirstIssue(
  tx: Transaction,
  actor: Pick<Actor, "id">,
  caseId: string,
): Promise<void> {
  const [open] = await tx
    .select({ id: reportIssues.id })
    .from(reportIssues)
    .where(eq(reportIssues.caseId, caseId))
    .limit(1);
  if (open) return;
  await createIssue(tx, actor, {
    caseId,
    number: 1,
    reason: null,
    document: startingDocument(),
    rootCause: null,
  });
}

/** Opens an issue with the document it starts from. */
export async function createIssue(
  tx: Transaction,
  actor: Pick<Actor, "id">,
  issue: {
    caseId: string;
    number: number;
    reason: string | null;
    document: DocumentNode;
    rootCause: string | null;
  },
): Promise<{ issueId: string }> {
  const issueId = newId("issue");
  await tx.insert(reportIssues).values({ id: issueId, madeById: actor.id, ...issue });
  return { issueId };
}
