import "server-only";
import { sql } from "drizzle-orm";
import { database } from "@/db/client";
import { queueIsMoving } from "@/lib/jobs/queue";
import { log } from "@/lib/log";
import { mailTransport } from "@/lib/outbox/send-mail-job";
import { objectStore } from "@/lib/storage/s3";

export type Health = Record<"database" | "store" | "mail" | "jobs", "up" | "down">;

const PATIENCE_MS = 5_000;

async function state(name: string, check: () => Promise<boolean>): Promise<"up" | "down"> {
  const tooLate = new Promise<never>((_resolve, reject) => {
    setTimeout(() => reject(new Error(`${name} did not answer`)), PATIENCE_MS).unref();
  });
  try {
    return (await Promise.race([check(), tooLate])) ? "up" : "down";
  } catch (error) {
    log().warn({ err: error, part: name }, "health check failed");
    return "down";
  }
}

/** Whether the parts that Riverline rests on answer. No detail that would help an intruder. */
export async function health(): Promise<Health> {
  const [db, store, mail, jobs] = await Promise.all([
    state("database", async () => {
      await database().execute(sql`select 1`);
      return true;
    }),
    state("store", () => objectStore().isUp()),
    state("mail", async () => (await mailTransport().verify()) === true),
    state("jobs", () => queueIsMoving()),
  ]);
  return { database: db, store, mail, jobs };
}
