import "server-only";
import { eq, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { throttles } from "@/db/schema";
import { sha256Hex } from "@/lib/canonical-json";
import { env } from "@/lib/env";

const WINDOW_MS = 15 * 60_000;
export const TRIES_PER_ACCOUNT = 8;
export const TRIES_PER_ADDRESS = 40;

type Headers = Record<string, string | string[] | undefined>;

/** Address of the caller. Behind a proxy of one's own the last entry is the one it added. */
export function addressOf(headers: Headers): string {
  const value = headers["x-forwarded-for"];
  const list = (Array.isArray(value) ? value.join(",") : (value ?? ""))
    .split(",")
    .map((part) => part.trim());
  return (env().TRUST_PROXY ? list.at(-1) : list[0]) || "unknown";
}

const accountKey = (email: string) =>
  `account:${sha256Hex(email.trim().toLowerCase()).slice(0, 48)}`;
const addressKey = (address: string) => `address:${sha256Hex(address).slice(0, 48)}`;

/** Counts one try for a key; false when it has used up its tries in the present window. */
async function take(key: string, most: number): Promise<boolean> {
  const now = new Date();
  const windowStart = new Date(now.getTime() - WINDOW_MS);
  // MariaDB assigns from left to right, so the count is set while the old window still stands.
  await database().execute(sql`
    insert into ${throttles} (\`key\`, window_started_at, tries) values (${key}, ${now}, 1)
    on duplicate key update
      tries = if(window_started_at <= ${windowStart}, 1, tries + 1),
      window_started_at = if(window_started_at <= ${windowStart}, ${now}, window_started_at)`);
  const [row] = await database()
    .select({ tries: throttles.tries })
    .from(throttles)
    .where(eq(throttles.key, key));
  return (row?.tries ?? 0) <= most;
}

/** Takes one try back that was no failure. */
async function giveBack(key: string): Promise<void> {
  await database()
    .update(throttles)
    .set({ tries: sql`greatest(${throttles.tries} - 1, 0)` })
    .where(eq(throttles.key, key));
}

/**
 * Counts a try for the account and the address before it is made, so that tries at the same time
 * do not slip through together. False when either has none left; then nothing may be tried.
 */
export async function takeTry(account: string, address: string): Promise<boolean> {
  if (!(await take(addressKey(address), TRIES_PER_ADDRESS))) return false;
  if (await take(accountKey(account), TRIES_PER_ACCOUNT)) return true;
  await giveBack(addressKey(address));
  return false;
}

/** After the right password: the account has all its tries again, and this one was no failure. */
export async function forgetTry(account: string, address: string): Promise<void> {
  await forgetFailures(account);
  await giveBack(addressKey(address));
}

export async function forgetFailures(email: string): Promise<void> {
  await database()
    .delete(throttles)
    .where(eq(throttles.key, accountKey(email)));
}
