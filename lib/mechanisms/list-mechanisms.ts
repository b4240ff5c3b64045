import "server-only";
import { and, asc, eq, ne } from "drizzle-orm";
import { database } from "@/db/client";
import { people, records, recordVersions } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { decide } from "@/lib/auth/policy";
import { getCase } from "@/lib/cases/get-case";
import { type MechanismContent, mechanismContent } from "./schemas";

export type MechanismRow = {
  recordId: string;
  label: string;
  version: number;
  content: MechanismContent;
  by: string;
  at: string;
};

/** Mechanisms of a case in the order they were thought of. */
export async function listMechanisms(
  actor: Actor,
  caseId: string,
): Promise<{ mechanisms: MechanismRow[]; refusal: string | null }> {
  const { subject } = await getCase(actor, "case.viewWork", caseId);
  const rows = await database()
    .select({
      recordId: records.id,
      label: records.label,
      version: records.latestVersion,
      content: recordVersions.content,
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
      and(eq(records.caseId, caseId), eq(records.kind, "mechanism"), ne(records.state, "void")),
    )
    .orderBy(asc(records.madeAt), asc(records.id));
  const decision = decide(actor, "mechanism.weigh", subject);
  return {
    mechanisms: rows.map((row) => ({
      ...row,
      content: mechanismContent.parse(row.content),
      at: row.at.toISOString(),
    })),
    refusal: decision.allowed ? null : decision.says,
  };
}
