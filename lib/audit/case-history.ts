import "server-only";
import { and, desc, eq, lt } from "drizzle-orm";
import { database } from "@/db/client";
import { auditEvents, auditHeads } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { type Role, ROLES } from "@/lib/people/constants";
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
  return {
    entries: rows.map((row) => ({
      position: row.position,
      at: row.at.toISOString(),
      who: row.actorName,
      role: ROLES.find((role) => role === row.actorRole) ?? null,
      what: describeEvent(row),
      before: row.before,
      after: row.after,
      seal: row.sha256.slice(0, 8).replace(/(.{4})(?=.)/, "$1 "),
    })),
    total: head?.position ?? 0,
    nextBefore: last && last.position > 1 && rows.length === PAGE ? last.position : null,
    fault: report.faults[0]?.says ?? null,
  };
}
