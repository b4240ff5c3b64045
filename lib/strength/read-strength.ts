import "server-only";
import { and, eq, ne } from "drizzle-orm";
import { database } from "@/db/client";
import { people, records, recordVersions } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { decide } from "@/lib/auth/policy";
import { getCase } from "@/lib/cases/get-case";
import { citableValues, type CitableEntry } from "@/lib/records/citable-entries";
import { type StrengthContent, strengthContent } from "./schemas";

export type StrengthPageData = {
  statement: { content: StrengthContent; version: number; by: string; at: string } | null;
  /** What can be set side by side: hardness, conversions, and what the drawing asks. */
  sources: CitableEntry[];
  refusal: string | null;
};

/** The strength statement of a case and the values it speaks of. */
export async function readStrength(actor: Actor, caseId: string): Promise<StrengthPageData> {
  const { subject } = await getCase(actor, "case.viewWork", caseId);
  const [[row], entries] = await Promise.all([
    database()
      .select({
        content: recordVersions.content,
        version: recordVersions.number,
        by: people.name,
        at: recordVersions.madeAt,
      })
      .from(records)
      .innerJoin(
        recordVersions,
        and(
          eq(recordVersions.recordId, records.id),
          eq(recordVersions.number, records.latestVersion),
        ),
      )
      .innerJoin(people, eq(people.id, recordVersions.madeById))
      .where(
        and(
          eq(records.caseId, caseId),
          eq(records.kind, "strength_statement"),
          ne(records.state, "void"),
        ),
      ),
    citableValues(database(), caseId, ["hardness_result", "field_return"]),
  ]);
  const decision = decide(actor, "strength.state", subject);
  return {
    statement: row
      ? { ...row, content: strengthContent.parse(row.content), at: row.at.toISOString() }
      : null,
    sources: entries.filter((entry) =>
      /hardness|strength|grade|material|R\u2098|MPa|HV|HRC|HBW/i.test(
        `${entry.label} ${entry.text}`,
      ),
    ),
    refusal: decision.allowed ? null : decision.says,
  };
}
