import path from "node:path";
import { sql } from "drizzle-orm";
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

if (process.argv[1] && path.basename(process.argv[1]) === "migrate.ts") {
  await migrateDatabase();
  await closeDatabase();
  console.log("database is at the newest schema");
}
