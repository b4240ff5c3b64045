import "server-only";
import { and, desc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { auditEvents, auditHeads, cases } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import { INSTALLATION_CHAIN } from "./chain";
import { type ChainReport, verifyChains } from "./verify-chain";

export type ChainRow = {
  chain: string;
  name: string;
  entries: number;
  lastAt: string;
  fingerprint: string;
};

const LISTED = 200;

/** The newest chains, and the outcome of walking through all of them. */
export async function listChains(
  actor: Actor,
): Promise<{ report: ChainReport; chains: ChainRow[]; checkedAt: string }> {
  requireAllowed(actor, "audit.verify");
  const report = await verifyChains();
  const rows = await database()
    .select({
      chain: auditHeads.chain,
      entries: auditHeads.position,
      sha256: auditHeads.sha256,
      lastAt: auditEvents.at,
      number: cases.number,
    })
    .from(auditHeads)
    .innerJoin(
      auditEvents,
      and(eq(auditEvents.chain, auditHeads.chain), eq(auditEvents.position, auditHeads.position)),
    )
    .leftJoin(cases, eq(cases.id, auditHeads.chain))
    .orderBy(desc(auditEvents.at))
    .limit(LISTED);
  return {
    report,
    checkedAt: new Date().toISOString(),
    chains: rows.map((row) => ({
      chain: row.chain,
      name: row.chain === INSTALLATION_CHAIN ? "Installation" : (row.number ?? "Draft"),
      entries: row.entries,
      lastAt: row.lastAt.toISOString(),
      fingerprint: row.sha256.slice(0, 16).replace(/(.{4})(?=.)/g, "$1 "),
    })),
  };
}
