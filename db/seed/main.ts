import { eq, sql } from "drizzle-orm";
import { z } from "zod";
import { closeDatabase, database } from "@/db/client";
import { rawRows } from "@/db/raw-rows";
import { people, settings } from "@/db/schema";
import { env } from "@/lib/env";
import { objectStore } from "@/lib/storage/s3";
import { castOf } from "./actors";
import { seedPeople } from "./people";
import { writeStory } from "./story";

const BEGUN = "demo.begun";
const DONE = "demo.done";

async function has(name: string): Promise<boolean> {
  const [row] = await database().select().from(settings).where(eq(settings.name, name));
  return row !== undefined;
}

const mark = (name: string) =>
  database()
    .insert(settings)
    .values({ name, value: { at: new Date().toISOString() } });

/** Empties what an earlier writing that was cut short has left; nobody has worked in it yet. */
async function emptyAll(): Promise<void> {
  const tables = await rawRows(
    database(),
    sql`select table_name as name from information_schema.tables where table_schema = database() and table_type = 'BASE TABLE' and table_name not like '\\_\\_%'`,
    z.object({ name: z.string() }),
  );
  await database().transaction(async (tx) => {
    await tx.execute(sql`set foreign_key_checks = 0`);
    for (const { name } of tables) await tx.execute(sql`truncate table ${sql.identifier(name)}`);
    await tx.execute(sql`set foreign_key_checks = 1`);
  });
}

/** Fills an empty installation with the demonstration, once. */
async function seed(): Promise<string> {
  await objectStore().prepare(new URL(env().NEXTAUTH_URL).origin);
  if (await has(DONE)) return "the demonstration is in place";
  if (await has(BEGUN)) await emptyAll();
  const [someone] = await database().select({ id: people.id }).from(people).limit(1);
  if (someone) return "people exist already; the demonstration is left out";
  await mark(BEGUN);
  await writeStory(await castOf(await seedPeople()));
  await mark(DONE);
  return "the demonstration is written";
}

console.log(await seed());
await closeDatabase();
