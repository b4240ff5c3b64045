import "server-only";
import { and, asc, eq, lt, lte, or, sql } from "drizzle-orm";
import { database, type Transaction } from "@/db/client";
import { jobs } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { newId } from "@/lib/new-id";
import type { JobKind } from "./constants";

export type Job = {
  id: string;
  kind: JobKind;
  payload: unknown;
  attempts: number;
  maxAttempts: number;
};

export const LEASE_MS = 60_000;

/** Puts a job in the queue, in the transaction of the deed that calls for it. */
export async function enqueue(
  tx: Transaction,
  job: { kind: JobKind; payload: unknown; uniqueKey?: string; runAt?: Date; maxAttempts?: number },
): Promise<void> {
  await tx
    .insert(jobs)
    .values({
      id: newId("job"),
      kind: job.kind,
      payload: job.payload,
      uniqueKey: job.uniqueKey ?? null,
      runAt: job.runAt ?? new Date(),
      ...(job.maxAttempts !== undefined && { maxAttempts: job.maxAttempts }),
    })
    .onDuplicateKeyUpdate({ set: { id: sql`${jobs.id}` } });
}

/** Takes the next ready job for `worker`; no two workers get the same one. Null when there is none. */
export async function claim(worker: string): Promise<Job | null> {
  return transaction(async (tx) => {
    const [job] = await tx
      .select()
      .from(jobs)
      .where(and(eq(jobs.state, "ready"), lte(jobs.runAt, new Date())))
      .orderBy(asc(jobs.runAt), asc(jobs.id))
      .limit(1)
      .for("update", { skipLocked: true });
    if (!job) return null;
    await tx
      .update(jobs)
      .set({
        state: "running",
        worker,
        attempts: job.attempts + 1,
        leaseUntil: new Date(Date.now() + LEASE_MS),
      })
      .where(eq(jobs.id, job.id));
    return {
      id: job.id,
      kind: job.kind,
      payload: job.payload,
      attempts: job.attempts + 1,
      maxAttempts: job.maxAttempts,
    };
  });
}

/** Keeps a claimed job; false when the lease was lost to another worker. */
export async function heartbeat(jobId: string, worker: string): Promise<boolean> {
  const [result] = await database()
    .update(jobs)
    .set({ leaseUntil: new Date(Date.now() + LEASE_MS) })
    .where(and(eq(jobs.id, jobId), eq(jobs.worker, worker), eq(jobs.state, "running")));
  return result.affectedRows === 1;
}

export async function complete(jobId: string, worker: string): Promise<void> {
  await database()
    .update(jobs)
    .set({ state: "done", finishedAt: new Date(), leaseUntil: null, lastError: null })
    .where(and(eq(jobs.id, jobId), eq(jobs.worker, worker), eq(jobs.state, "running")));
}

/** Puts a failed job back with growing pauses, or lays it aside after its last try. */
export async function fail(job: Job, worker: string, error: string): Promise<{ isDead: boolean }> {
  const isDead = job.attempts >= job.maxAttempts;
  const pauseMs = Math.min(2 ** job.attempts * 1000, 15 * 60_000);
  await database()
    .update(jobs)
    .set({
      state: isDead ? "dead" : "ready",
      runAt: new Date(Date.now() + pauseMs),
      leaseUntil: null,
      worker: null,
      lastError: error.slice(0, 4000),
      ...(isDead && { finishedAt: new Date() }),
    })
    .where(and(eq(jobs.id, job.id), eq(jobs.worker, worker), eq(jobs.state, "running")));
  return { isDead };
}

/** Puts back jobs whose worker stopped without a word. */
export async function reclaimLost(): Promise<number> {
  const [result] = await database()
    .update(jobs)
    .set({
      state: "ready",
      worker: null,
      leaseUntil: null,
      runAt: new Date(),
      lastError: "the worker stopped",
    })
    .where(
      and(
        eq(jobs.state, "running"),
        lt(jobs.leaseUntil, new Date()),
        lt(jobs.attempts, jobs.maxAttempts),
      ),
    );
  await database()
    .update(jobs)
    .set({ state: "dead", finishedAt: new Date(), lastError: "the worker stopped at the last try" })
    .where(and(eq(jobs.state, "running"), lt(jobs.leaseUntil, new Date())));
  return result.affectedRows;
}

/** Whether the queue moves: nothing ready has waited longer than `patienceMs`. */
export async function queueIsMoving(patienceMs = 120_000): Promise<boolean> {
  const [oldest] = await database()
    .select({ id: jobs.id })
    .from(jobs)
    .where(
      or(
        and(eq(jobs.state, "ready"), lt(jobs.runAt, new Date(Date.now() - patienceMs))),
        and(eq(jobs.state, "running"), lt(jobs.leaseUntil, new Date(Date.now() - patienceMs))),
      ),
    )
    .limit(1);
  return oldest === undefined;
}
