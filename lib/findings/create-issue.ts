import "server-only";
import { eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { reportIssues } from "@/db/schema";
import { newId } from "@/lib/new-id";
import type { DocumentNode } from "./document";

const EMPTY_DOCUMENT: DocumentNode = { type: "doc", content: [{ type: "paragraph" }] };

/**
 * Opens issue 1 of the findings when a case is accepted; a case that has one keeps it. Nobody is
 * its author yet: that is who writes in it.
 */
export async function createFirstIssue(tx: Transaction, caseId: string): Promise<void> {
  const [open] = await tx
    .select({ id: reportIssues.id })
    .from(reportIssues)
    .where(eq(reportIssues.caseId, caseId))
    .limit(1);
  if (open) return;
  await tx
    .insert(reportIssues)
    .values({ id: newId("issue"), caseId, number: 1, document: EMPTY_DOCUMENT });
}
