import { and, inArray, lte } from "drizzle-orm";
import { database } from "@/db/client";
import { jobs } from "@/db/schema";

type Work = (signal: AbortSignal, concurrency: number) => Promise<void>;

/** Lets workers work until nothing is due any more. Each takes `lanes` jobs at once. */
export async function workOff(work: Work, workers = 1, lanes = 1): Promise<void> {
  const stop = new AbortController();
  const running = Promise.all(Array.from({ length: workers }, () => work(stop.signal, lanes)));
  try {
    while (await isAnyDue()) await new Promise((resolve) => setTimeout(resolve, 30));
  } finally {
    stop.abort();
    await running;
  }
}

async function isAnyDue(): Promise<boolean> {
  const [due] = await database()
    .select({ id: jobs.id })
    .from(jobs)
    .where(and(inArray(jobs.state, ["ready", "running"]), lte(jobs.runAt, new Date())))
    .limit(1);
  return due !== undefined;
}

/** Ends the pause after a failed try. */
export async function endPauses(): Promise<void> {
  await database().update(jobs).set({ runAt: new Date() });
}
