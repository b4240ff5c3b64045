import "server-only";
import { and, desc, eq, inArray, lt } from "drizzle-orm";
import { database } from "@/db/client";
import { auditEvents, auditHeads, people, records, reportIssues } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { type Role, ROLES } from "@/lib/people/constants";
import { type ChangeLine, describeChange, idsIn, type Names } from "./describe-change";
import { describeEvent } from "./describe-event";
import { verifyChains } from "./verify-chain";

const PAGE = 100;

export type HistoryEntry = {
  position: number;
  at: string;
  who: string;
  /** Null when Riverline itself acted. */
  role: Role | null;
  what: string;
  change: ChangeLine[];
  before: unknown;
  after: unknown;
  /** First figures of the entry's digest. */
  seal: string;
};
export type CaseHistory = {
  entries: HistoryEntry[];
  total: number;
  nextBefore: number | null;
  /** First entry that does not fit, in words; null when all fit. */
  fault: string | null;
};

/** One page of the audit chain of a case, newest first, and whether the chain fits. */
export async function caseHistory(
  actor: Actor,
  caseId: string,
  before: number | null,
): Promise<CaseHistory> {
  await getCase(actor, "case.viewHistory", caseId);
  const [rows, [head], report] = await Promise.all([
    database()
      .select()
      .from(auditEvents)
      .where(
        and(
          eq(auditEvents.chain, caseId),
          before === null ? undefined : lt(auditEvents.position, before),
        ),
      )
      .orderBy(desc(auditEvents.position))
      .limit(PAGE),
    database().select().from(auditHeads).where(eq(auditHeads.chain, caseId)),
    verifyChains(caseId),
  ]);
  const last = rows.at(-1);
  const names = await namesOf(rows.flatMap((row) => idsIn([row.before, row.after])));
  return {
    entries: rows.map((row) => ({
      position: row.position,
      at: row.at.toISOString(),
      who: row.actorName,
      role: ROLES.find((role) => role === row.actorRole) ?? null,
      what: describeEvent(row),
      change: describeChange(row.before, row.after, names),
      before: row.before,
      after: row.after,
      seal: row.sha256.slice(0, 8).replace(/(.{4})(?=.)/, "$1 "),
    })),
    total: head?.position ?? 0,
    nextBefore: last && last.position > 1 && rows.length === PAGE ? last.position : null,
    fault: report.faults[0]?.says ?? null,
  };
}

/** What people, records and reports are called. */
async function namesOf(ids: readonly string[]): Promise<Names> {
  const wanted = [...new Set(ids)];
  if (wanted.length === 0) return new Map();
  const [persons, labels, issues] = await Promise.all([
    database()
      .select({ id: people.id, name: people.name })
      .from(people)
      .where(inArray(people.id, wanted)),
    database()
      .select({ id: records.id, name: records.label })
      .from(records)
      .where(inArray(records.id, wanted)),
    database()
      .select({ id: reportIssues.id, number: reportIssues.number })
      .from(reportIssues)
      .where(inArray(reportIssues.id, wanted)),
  ]);
  return new Map([
    ...[...persons, ...labels].map(({ id, name }) => [id, name] as const),
    ...issues.map(({ id, number }) => [id, `issue ${number}`] as const),
  ]);
}
