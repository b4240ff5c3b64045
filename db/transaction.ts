import { database, type Transaction } from "./client";

const DEADLOCK = 1213;
const LOCK_WAIT_TIMEOUT = 1205;
const TRIES = 4;

/** Error number of MariaDB behind an error of Drizzle, or null. */
export function databaseErrorNumber(error: unknown): number | null {
  const cause = error instanceof Error && error.cause !== undefined ? error.cause : error;
  return typeof cause === "object" &&
    cause !== null &&
    "errno" in cause &&
    typeof cause.errno === "number"
    ? cause.errno
    : null;
}

export const DUPLICATE_KEY = 1062;

/**
 * Runs `work` in one transaction. The loser of a deadlock is run again, so `work` must do
 * nothing but write to the database.
 */
export async function transaction<T>(work: (tx: Transaction) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await database().transaction(work, { isolationLevel: "read committed" });
    } catch (error) {
      const errno = databaseErrorNumber(error);
      if ((errno !== DEADLOCK && errno !== LOCK_WAIT_TIMEOUT) || attempt === TRIES) throw error;
      await new Promise((resolve) => setTimeout(resolve, 20 * attempt * attempt));
    }
  }
}
