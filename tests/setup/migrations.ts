import { execFile } from "node:child_process";
import { createHash } from "node:crypto";
import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { promisify } from "node:util";

const FOLDER = "drizzle";

/** Changes with any migration, so that a schema made from other ones is not used. */
export function migrationsHash(): string {
  const hash = createHash("sha256");
  for (const file of readdirSync(FOLDER).sort()) {
    if (file.endsWith(".sql")) hash.update(file).update(readFileSync(path.join(FOLDER, file)));
  }
  return hash.digest("hex");
}

/** Brings a schema up to date with the very command that a start uses. */
export async function migrate(databaseUrl: string): Promise<void> {
  const args = ["--conditions=react-server", "--import", "tsx", "db/migrate.ts"];
  const env = { ...process.env, DATABASE_URL: databaseUrl, NODE_OPTIONS: "" };
  await promisify(execFile)(process.execPath, args, { env });
}
