import { sql, type SQL } from "drizzle-orm";
import { readMigrationFiles, type MigrationMeta } from "drizzle-orm/migrator";
import { z } from "zod";
import type { Database, Reader } from "./client";
import { rawRows } from "./raw-rows";

/**
 * MariaDB cannot roll back a change of the schema, so a migration that is cut short stays half
 * done. Each statement is therefore noted before and after it runs, and the next try goes on from
 * there. The list of finished migrations is in the table and form that drizzle-kit uses.
 */
export async function applyMigrations(db: Database, migrationsFolder: string): Promise<void> {
  await db.execute(sql`
    create table if not exists \`__drizzle_migrations\`
      (id serial primary key, hash text not null, created_at bigint)`);
  await db.execute(sql`
    create table if not exists \`__migration_progress\`
      (created_at bigint primary key, begun int not null, done int not null)`);
  const finished = await numbers(db, sql`select created_at as n from \`__drizzle_migrations\``);
  for (const migration of readMigrationFiles({ migrationsFolder })) {
    if (!finished.includes(migration.folderMillis)) await applyMigration(db, migration);
  }
}

async function applyMigration(
  db: Database,
  { folderMillis, hash, sql: statements }: MigrationMeta,
) {
  await db.execute(sql`
    insert ignore into \`__migration_progress\` values (${folderMillis}, 0, 0)`);
  const [progress] = await rawRows(
    db,
    sql`select begun, done from \`__migration_progress\` where created_at = ${folderMillis}`,
    z.object({ begun: z.number(), done: z.number() }),
  );
  const { begun, done } = progress ?? { begun: 0, done: 0 };
  for (const [index, statement] of statements.entries()) {
    if (index < done) continue;
    await note(db, folderMillis, sql`begun = ${index + 1}`);
    // One transaction: rows and note change together. A change of the schema ends it by itself.
    await db.transaction(async (tx) => {
      try {
        await tx.execute(sql.raw(statement));
      } catch (error) {
        const triedBefore = index < begun;
        if (!triedBefore || !saysAlreadyDone(error)) throw error;
      }
      await note(tx, folderMillis, sql`done = ${index + 1}`);
    });
  }
  await db.transaction(async (tx) => {
    await tx.execute(sql`
      insert into \`__drizzle_migrations\` (hash, created_at) values (${hash}, ${folderMillis})`);
    await tx.execute(sql`
      delete from \`__migration_progress\` where created_at = ${folderMillis}`);
  });
}

async function note(reader: Reader, folderMillis: number, change: SQL) {
  await reader.execute(sql`
    update \`__migration_progress\` set ${change} where created_at = ${folderMillis}`);
}

async function numbers(reader: Reader, query: SQL): Promise<number[]> {
  const rows = await rawRows(reader, query, z.object({ n: z.coerce.number() }));
  return rows.map((row) => row.n);
}

/** Table, column, key, trigger or constraint exists already, or is gone already. */
const ALREADY_DONE = new Set([1050, 1051, 1060, 1061, 1091, 1359, 1826]);
const CANNOT_CREATE_TABLE = 1005;
const serverError = z.object({ errno: z.number(), sqlMessage: z.string() });

function saysAlreadyDone(error: unknown): boolean {
  const cause = serverError.safeParse(error instanceof Error ? error.cause : undefined);
  if (!cause.success) return false;
  const { errno, sqlMessage } = cause.data;
  // A foreign key that exists already is told in words only.
  if (errno === CANNOT_CREATE_TABLE) return sqlMessage.includes("errno: 121 ");
  return ALREADY_DONE.has(errno);
}
