import "server-only";
import { desc, eq } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { cases, caseTechnicians, reportIssues, reportRevisions } from "@/db/schema";
import type { CaseSubject } from "@/lib/auth/policy";

export type CaseRow = typeof cases.$inferSelect;
export type LoadedCase = { row: CaseRow; subject: CaseSubject };

/** A case with what the policy needs to know of it, or null. `lock` holds the row to the end. */
export async function findCase(
  reader: Reader,
  caseId: string,
  lock: "lock" | "read" = "read",
): Promise<LoadedCase | null> {
  const query = reader.select().from(cases).where(eq(cases.id, caseId));
  const [row] = lock === "lock" ? await query.for("update") : await query;
  if (!row) return null;
  const [technicians, issues] = await Promise.all([
    reader
      .select({ id: caseTechnicians.personId })
      .from(caseTechnicians)
      .where(eq(caseTechnicians.caseId, caseId)),
    reader
      .select({
        id: reportIssues.id,
        number: reportIssues.number,
        releasedAt: reportIssues.releasedAt,
      })
      .from(reportIssues)
      .where(eq(reportIssues.caseId, caseId))
      .orderBy(desc(reportIssues.number)),
  ]);
  const open = issues[0];
  const authors = open
    ? await reader
        .selectDistinct({ id: reportRevisions.savedById })
        .from(reportRevisions)
        .where(eq(reportRevisions.issueId, open.id))
    : [];
  return {
    row,
    subject: {
      state: row.state,
      wasSent: row.number !== null,
      organisationId: row.organisationId,
      requesterId: row.requesterId,
      investigatorId: row.investigatorId,
      leadId: row.leadId,
      secondReaderId: row.secondReaderId,
      technicianIds: technicians.map((t) => t.id),
      isRestricted: row.isRestricted,
      authorIds: authors.map((a) => a.id),
      hasReleasedIssue: issues.some((issue) => issue.releasedAt !== null),
    },
  };
}
