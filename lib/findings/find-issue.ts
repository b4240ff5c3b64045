import "server-only";
import { desc, eq } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { reportIssues } from "@/db/schema";
import { findingsDocument } from "./document-schema";
import type { DocumentNode } from "./document";

export type IssueRow = Omit<typeof reportIssues.$inferSelect, "document"> & {
  document: DocumentNode;
};

/** The newest issue of a case, or null before the case is accepted. `lock` holds the row. */
export async function findIssue(
  reader: Reader,
  caseId: string,
  lock: "lock" | "read" = "read",
): Promise<IssueRow | null> {
  const query = reader
    .select()
    .from(reportIssues)
    .where(eq(reportIssues.caseId, caseId))
    .orderBy(desc(reportIssues.number))
    .limit(1);
  const [row] = lock === "lock" ? await query.for("update") : await query;
  return row ? { ...row, document: findingsDocument.parse(row.document) } : null;
}
