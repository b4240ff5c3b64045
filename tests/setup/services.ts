import { afterAll } from "vitest";
import "./console";
import { takeSlot } from "./slot";

/**
 * Runs before each file of tests that need the services: gives the file a schema and a bucket of
 * its own, empty, and points the settings at them before anything reads them.
 */
const slot = await takeSlot();
process.env.DATABASE_URL = slot.databaseUrl;
process.env.S3_BUCKET = slot.bucket;

if (slot.isNew) {
  const { env } = await import("@/lib/env");
  const { objectStore } = await import("@/lib/storage/s3");
  await objectStore().prepare(new URL(env().NEXTAUTH_URL).origin);
  await slot.remember();
}

afterAll(async () => {
  const { closeDatabase } = await import("@/db/client");
  await closeDatabase();
  await slot.release();
});
