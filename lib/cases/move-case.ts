import "server-only";
import { eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { caseMoves, cases } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { AppError } from "@/lib/errors";
import { newId } from "@/lib/new-id";
import { recordEvent } from "@/lib/audit/record";
import { STAGE_OF_STATE } from "./constants";
import { canMove, type MoveName, MOVES } from "./lifecycle";
import type { CaseRow } from "./subject";

/**
 * Moves a locked case along one arrow of the state machine and records the event.
 * @throws AppError LOCKED when the arrow does not start at the case's state.
 */
export async function moveCase(
  tx: Transaction,
  actor: Actor | null,
  row: CaseRow,
  name: MoveName,
  change: Partial<typeof cases.$inferInsert> = {},
  reason: string | null = null,
  details: Record<string, unknown> = {},
): Promise<void> {
  const move = MOVES[name];
  if (!canMove(name, row.state)) {
    throw new AppError(
      "LOCKED",
      "The case has moved on since this page was opened. Nothing was changed. Load it again.",
    );
  }
  await tx
    .update(cases)
    .set({ ...change, state: move.to, stage: STAGE_OF_STATE[move.to] })
    .where(eq(cases.id, row.id));
  await tx.insert(caseMoves).values({
    id: newId("move"),
    caseId: row.id,
    fromState: row.state,
    toState: move.to,
    reason,
    byId: actor?.id ?? null,
  });
  await recordEvent(tx, {
    caseId: row.id,
    actor,
    action: move.action,
    subject: {
      kind: "case",
      id: row.id,
      label: change.number ?? row.number ?? (row.title || "Draft"),
    },
    before: { state: row.state },
    after: { state: move.to, reason, ...change, ...details },
  });
}
