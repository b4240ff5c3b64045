import "server-only";
import { and, asc, eq, gt } from "drizzle-orm";
import { database } from "@/db/client";
import { auditEvents, auditHeads } from "@/db/schema";
import { canonicalJson, sha256Hex } from "@/lib/canonical-json";
import { START_OF_CHAIN, type ChainedEvent } from "./chain";

export type ChainFault = {
  chain: string;
  position: number;
  what: "missing" | "changed" | "out-of-order" | "cut-off";
  says: string;
};
export type ChainReport = { chainCount: number; eventCount: number; faults: ChainFault[] };

const BATCH = 500;

/** First entry of a chain that does not fit, or null when all do. */
async function verifyOne(chain: string, head: { position: number; sha256: string }) {
  let previous = START_OF_CHAIN;
  let position = 0;
  for (;;) {
    const rows = await database()
      .select()
      .from(auditEvents)
      .where(and(eq(auditEvents.chain, chain), gt(auditEvents.position, position)))
      .orderBy(asc(auditEvents.position))
      .limit(BATCH);
    if (rows.length === 0) break;
    for (const { id: _id, sha256, ...row } of rows) {
      const entry: ChainedEvent = row;
      if (entry.position !== position + 1) {
        return fault(chain, position + 1, "missing", `Entry ${position + 1} is missing.`);
      }
      if (entry.previousSha256 !== previous) {
        return fault(
          chain,
          entry.position,
          "out-of-order",
          `Entry ${entry.position} does not follow on entry ${position}.`,
        );
      }
      if (sha256Hex(canonicalJson(entry)) !== sha256) {
        return fault(
          chain,
          entry.position,
          "changed",
          `Entry ${entry.position} was changed after it was written.`,
        );
      }
      previous = sha256;
      position = entry.position;
    }
  }
  if (position !== head.position || previous !== head.sha256) {
    return fault(
      chain,
      position + 1,
      "cut-off",
      `The chain ends after entry ${position}; it should have ${head.position}.`,
    );
  }
  return { fault: null, count: position };
}

function fault(chain: string, position: number, what: ChainFault["what"], says: string) {
  return { fault: { chain, position, what, says }, count: position };
}

/** Walks every chain, or one, and names the first entry of each that does not fit. */
export async function verifyChains(onlyChain?: string): Promise<ChainReport> {
  const heads = await database()
    .select()
    .from(auditHeads)
    .where(onlyChain === undefined ? undefined : eq(auditHeads.chain, onlyChain))
    .orderBy(asc(auditHeads.chain));
  const report: ChainReport = { chainCount: heads.length, eventCount: 0, faults: [] };
  for (const head of heads) {
    const result = await verifyOne(head.chain, head);
    report.eventCount += result.count;
    if (result.fault) report.faults.push(result.fault);
  }
  return report;
}
