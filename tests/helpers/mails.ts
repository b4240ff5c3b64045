import { asc, eq } from "drizzle-orm";
import { z } from "zod";
import { database } from "@/db/client";
import { jobs } from "@/db/schema";

const mail = z.object({
  to: z.string(),
  subject: z.string(),
  news: z.string(),
  facts: z.array(z.tuple([z.string(), z.string()])),
  button: z.object({ label: z.string(), path: z.string() }).nullable(),
  after: z.string().optional(),
});
export type QueuedMail = z.infer<typeof mail>;

/** What waits in the outbox, in the order in which it was put there. */
export async function queuedMails(): Promise<QueuedMail[]> {
  const rows = await database()
    .select({ payload: jobs.payload })
    .from(jobs)
    .where(eq(jobs.kind, "mail.send"))
    .orderBy(asc(jobs.madeAt));
  return rows.map(({ payload }) => mail.parse(payload));
}

/** What this deed put into the outbox. */
export async function mailsOf(deed: () => Promise<unknown>): Promise<QueuedMail[]> {
  await emptyOutbox();
  await deed();
  return queuedMails();
}

export async function emptyOutbox(): Promise<void> {
  await database().delete(jobs).where(eq(jobs.kind, "mail.send"));
}
