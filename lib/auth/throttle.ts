import "server-only";
import { eq, inArray, sql } from "drizzle-orm";
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

export const accountKey = (email: string) =>
  `account:${sha256Hex(email.trim().toLowerCase()).slice(0, 48)}`;
export const addressKey = (address: string) => `address:${sha256Hex(address).slice(0, 48)}`;

/** Whether either key has used up its tries in the present window. */
export async function isThrottled(email: string, address: string): Promise<boolean> {
  const limits = new Map([
    [accountKey(email), TRIES_PER_ACCOUNT],
    [addressKey(address), TRIES_PER_ADDRESS],
  ]);
  const rows = await database()
    .select()
    .from(throttles)
    .where(inArray(throttles.key, [...limits.keys()]));
  const now = Date.now();
  return rows.some(
    (row) =>
      now - row.windowStartedAt.getTime() < WINDOW_MS &&
      row.tries >= (limits.get(row.key) ?? Infinity),
  );
}

/** Counts one failed try for both keys. */
export async function countFailure(email: string, address: string): Promise<void> {
  const now = new Date();
  const windowStart = new Date(now.getTime() - WINDOW_MS);
  for (const key of [accountKey(email), addressKey(address)]) {
    await database()
      .insert(throttles)
      .values({ key, windowStartedAt: now, tries: 1 })
      .onDuplicateKeyUpdate({
        set: {
          tries: sql`if(${throttles.windowStartedAt} < ${windowStart}, 1, ${throttles.tries} + 1)`,
          windowStartedAt: sql`if(${throttles.windowStartedAt} < ${windowStart}, ${now}, ${throttles.windowStartedAt})`,
        },
      });
  }
}

export async function forgetFailures(email: string): Promise<void> {
  await database()
    .delete(throttles)
    .where(eq(throttles.key, accountKey(email)));
}
