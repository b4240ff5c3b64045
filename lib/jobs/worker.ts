import "server-only";
import { randomUUID } from "node:crypto";
import { log } from "@/lib/log";
import { handlers } from "./handlers";
import { pause } from "./pause";
import { claim, complete, fail, heartbeat, type Job, LEASE_MS, reclaimLost } from "./queue";

const POLL_MS = 700;
const RECLAIM_EVERY_MS = 15_000;

/** Runs one job to its end; the lease is kept while it works. */
async function run(job: Job, worker: string): Promise<void> {
  const beat = setInterval(() => {
    heartbeat(job.id, worker).catch((error: unknown) =>
      log().warn({ err: error, job: job.id }, "heartbeat failed"),
    );
  }, LEASE_MS / 4);
  try {
    await handlers[job.kind].run(job.payload);
    await complete(job.id, worker);
  } catch (error) {
    const { isDead } = await fail(
      job,
      worker,
      error instanceof Error ? (error.stack ?? error.message) : String(error),
    );
    log().error(
      { err: error, job: job.id, kind: job.kind, attempt: job.attempts, isDead },
      "job failed",
    );
    if (isDead) await handlers[job.kind].givenUp?.(job.payload);
  } finally {
    clearInterval(beat);
  }
}

/** Works through the queue until `signal` says stop; the job in hand is finished first. */
export async function work(signal: AbortSignal, concurrency: number): Promise<void> {
  const lane = async () => {
    const worker = `w-${randomUUID()}`;
    while (!signal.aborted) {
      const job = await claim(worker);
      if (job) await run(job, worker);
      else await pause(POLL_MS * (0.75 + Math.random() / 2), signal);
    }
  };
  const reaper = async () => {
    while (!signal.aborted) {
      await reclaimLost();
      await pause(RECLAIM_EVERY_MS, signal);
    }
  };
  await Promise.all([reaper(), ...Array.from({ length: concurrency }, lane)]);
}
