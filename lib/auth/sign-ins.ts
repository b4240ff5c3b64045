import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { database } from "@/db/client";
import { organisations, people, signIns } from "@/db/schema";
import { env } from "@/lib/env";
import { newId } from "@/lib/new-id";
import type { Actor } from "./actor";

const TOUCH_EVERY_MS = 30_000;

/** `endsInMs` counts from the moment it was worked out, so that clocks need not agree. */
export type SignInDeadlines = { idleEndsAt: Date; endsAt: Date; endsInMs: number };

export function deadlinesOf(row: { startedAt: Date; lastUsedAt: Date }): SignInDeadlines {
  const endsAt = new Date(row.startedAt.getTime() + env().SESSION_MAX_HOURS * 3_600_000);
  const idle = new Date(row.lastUsedAt.getTime() + env().SESSION_IDLE_MINUTES * 60_000);
  const idleEndsAt = idle < endsAt ? idle : endsAt;
  return { idleEndsAt, endsAt, endsInMs: idleEndsAt.getTime() - Date.now() };
}

export async function startSignIn(person: { id: string; signInEpoch: number }): Promise<string> {
  const id = newId("sin");
  const now = new Date();
  await database().insert(signIns).values({
    id,
    personId: person.id,
    epoch: person.signInEpoch,
    startedAt: now,
    lastUsedAt: now,
  });
  return id;
}

/**
 * The person of a sign-in that still holds, or null: not ended, not idle too long, not too old,
 * person active, and nothing about them changed that ends sign-ins.
 */
export async function findSignIn(
  signInId: string,
  how: { countsAsUse: boolean },
): Promise<{ actor: Actor; deadlines: SignInDeadlines } | null> {
  const [row] = await database()
    .select({
      startedAt: signIns.startedAt,
      lastUsedAt: signIns.lastUsedAt,
      epoch: signIns.epoch,
      currentEpoch: people.signInEpoch,
      isActive: people.isActive,
      id: people.id,
      name: people.name,
      email: people.email,
      role: people.role,
      organisationId: organisations.id,
      organisationName: organisations.name,
      organisationKind: organisations.kind,
    })
    .from(signIns)
    .innerJoin(people, eq(people.id, signIns.personId))
    .innerJoin(organisations, eq(organisations.id, people.organisationId))
    .where(and(eq(signIns.id, signInId), isNull(signIns.endedAt)));
  const now = new Date();
  if (!row || !row.isActive || row.epoch !== row.currentEpoch) return null;
  if (deadlinesOf(row).idleEndsAt <= now) return null;
  let lastUsedAt = row.lastUsedAt;
  if (how.countsAsUse && now.getTime() - lastUsedAt.getTime() > TOUCH_EVERY_MS) {
    lastUsedAt = now;
    await database().update(signIns).set({ lastUsedAt }).where(eq(signIns.id, signInId));
  }
  return {
    actor: {
      id: row.id,
      name: row.name,
      email: row.email,
      role: row.role,
      organisationId: row.organisationId,
      organisationName: row.organisationName,
      organisationKind: row.organisationKind,
    },
    deadlines: deadlinesOf({ startedAt: row.startedAt, lastUsedAt }),
  };
}

export async function endSignIn(signInId: string): Promise<void> {
  await database()
    .update(signIns)
    .set({ endedAt: new Date() })
    .where(and(eq(signIns.id, signInId), isNull(signIns.endedAt)));
}
