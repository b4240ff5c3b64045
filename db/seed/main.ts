import { eq } from "drizzle-orm";
import { closeDatabase, database } from "@/db/client";
import { people, settings } from "@/db/schema";
import { env } from "@/lib/env";
import { objectStore } from "@/lib/storage/s3";
import { castOf } from "./actors";
import { seedPeople } from "./people";
import { writeStory } from "./story";

const MARKER = "demo.seeded";

/** Fills an empty installation with the demonstration, once. */
async function seed(): Promise<string> {
  await objectStore().prepare(new URL(env().NEXTAUTH_URL).origin);
  const db = database();
  const [done] = await db.select().from(settings).where(eq(settings.name, MARKER));
  if (done) return "the demonstration is in place";
  const [someone] = await db.select({ id: people.id }).from(people).limit(1);
  if (someone) return "people exist already; the demonstration is left out";
  await writeStory(await castOf(await seedPeople()));
  await db.insert(settings).values({ name: MARKER, value: { at: new Date().toISOString() } });
  return "the demonstration is written";
}

console.log(await seed());
await closeDatabase();
