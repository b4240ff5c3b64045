import "server-only";
import { eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { auditEvents, auditHeads } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import type { Action } from "@/lib/auth/policy";
import { canonicalJson, sha256Hex } from "@/lib/canonical-json";
import { SUBJECT_LABEL_MAX } from "./constants";
import { INSTALLATION_CHAIN, START_OF_CHAIN, type ChainedEvent } from "./chain";

/** Events that no person's action stands behind. */
export type SystemAction =
  | "system.seed"
  | "system.takeInImage"
  | "system.storeReport"
  | "system.signIn"
  | "system.signOut"
  | "system.setUp"
  | "system.password";

export type NewEvent = {
  caseId: string | null;
  /** Null when Riverline itself acted. */
  actor: Pick<Actor, "id" | "name" | "role"> | null;
  action: Action | SystemAction;
  subject: { kind: string; id: string; label: string };
  before: unknown;
  after: unknown;
};

/** A long title or name, cut between letters; the whole stands in what the event holds. */
function shortened(label: string): string {
  const letters = [...label];
  return letters.length <= SUBJECT_LABEL_MAX
    ? label
    : `${letters.slice(0, SUBJECT_LABEL_MAX - 1).join("")}…`;
}

/** Appends one event to the chain of its case, in the transaction of the deed. */
export async function recordEvent(tx: Transaction, event: NewEvent): Promise<void> {
  const chain = event.caseId ?? INSTALLATION_CHAIN;
  await tx
    .insert(auditHeads)
    .values({ chain, position: 0, sha256: START_OF_CHAIN })
    .onDuplicateKeyUpdate({ set: { chain: sql`${auditHeads.chain}` } });
  const [head] = await tx
    .select()
    .from(auditHeads)
    .where(eq(auditHeads.chain, chain))
    .for("update");
  if (!head) throw new Error(`audit chain ${chain} has no head`);

  const entry: ChainedEvent = {
    chain,
    position: head.position + 1,
    at: new Date(),
    actorId: event.actor?.id ?? null,
    actorName: event.actor?.name ?? "Riverline",
    actorRole: event.actor?.role ?? "system",
    action: event.action,
    subjectKind: event.subject.kind,
    subjectId: event.subject.id,
    subjectLabel: shortened(event.subject.label),
    before: event.before ?? null,
    after: event.after ?? null,
    previousSha256: head.sha256,
  };
  const sha256 = sha256Hex(canonicalJson(entry));
  await tx.insert(auditEvents).values({ ...entry, sha256 });
  await tx
    .update(auditHeads)
    .set({ position: entry.position, sha256 })
    .where(eq(auditHeads.chain, chain));
}
