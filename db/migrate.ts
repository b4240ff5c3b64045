import path from "node:path";
import { sql } from "drizzle-orm";
import { env } from "@/lib/env";
import { applyMigrations } from "./apply-migrations";
import { closeDatabase, database } from "./client";

/** Brings the database to the newest schema; several instances may try at once, one does it. */
export async function migrateDatabase(): Promise<void> {
  const db = database();
  await db.transaction(async (tx) => {
    await tx.execute(sql`select get_lock('riverline-migrate', 120)`);
    try {
      await applyMigrations(db, path.join(process.cwd(), "drizzle"));
    } finally {
      await tx.execute(sql`select release_lock('riverline-migrate')`);
    }
  });
}

/** Why the server could not be reached, in words; undefined for any other failure. */
function unreachable(error: unknown): string | undefined {
  const cause = error instanceof Error ? (error.cause ?? error) : error;
  const code = cause instanceof Error && "code" in cause ? String(cause.code) : "";
  const reached = ["ECONNREFUSED", "ENOTFOUND", "EAI_AGAIN", "ETIMEDOUT", "EHOSTUNREACH"];
  const refused = ["ER_ACCESS_DENIED_ERROR", "ER_DBACCESS_DENIED_ERROR", "ER_BAD_DB_ERROR"];
  const { host } = new URL(env().DATABASE_URL);
  if (reached.includes(code)) return `The database at ${host} does not answer (${code}).`;
  if (refused.includes(code)) return `The database at ${host} refuses DATABASE_URL (${code}).`;
  return undefined;
}

if (process.argv[1] && path.basename(process.argv[1]) === "migrate.ts") {
  try {
    await migrateDatabase();
    console.log("database is at the newest schema");
  } catch (error) {
    console.error(unreachable(error) ?? error);
    process.exitCode = 1;
  } finally {
    await closeDatabase();
  }
}
