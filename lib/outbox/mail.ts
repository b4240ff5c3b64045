import "server-only";
import type { Transaction } from "@/db/client";
import { env } from "@/lib/env";
import { enqueue } from "@/lib/jobs/queue";

/** A message in one column: the news first, then facts, then one button. Plain text says the same. */
export type Mail = {
  to: string;
  subject: string;
  news: string;
  facts: readonly [string, string][];
  button: { label: string; path: string } | null;
  after?: string;
};

/** Sends a message after the transaction, through the outbox. */
export async function queueMail(tx: Transaction, mail: Mail, uniqueKey?: string): Promise<void> {
  await enqueue(tx, { kind: "mail.send", payload: mail, ...(uniqueKey && { uniqueKey }) });
}

export const absoluteUrl = (path: string) => new URL(path, env().NEXTAUTH_URL).toString();
