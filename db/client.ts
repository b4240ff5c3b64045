import { drizzle, type MySql2Database } from "drizzle-orm/mysql2";
import mysql from "mysql2/promise";
import { env } from "@/lib/env";
import * as schema from "./schema";

export type Database = MySql2Database<typeof schema>;
export type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];
/** Reads take either; writes take a transaction. */
export type Reader = Database | Transaction;

const kept = globalThis as typeof globalThis & { riverlinePool?: mysql.Pool };

/** The pool behind `database()`, for what Drizzle does not offer. */
export function connectionPool(): mysql.Pool {
  if (kept.riverlinePool) return kept.riverlinePool;
  const made = mysql.createPool({
    uri: env().DATABASE_URL,
    connectionLimit: 10,
    timezone: "Z",
    supportBigNumbers: true,
    charset: "UTF8MB4_UNICODE_520_CI",
  });
  made.pool.on("connection", (connection) => connection.query("SET time_zone='+00:00'"));
  kept.riverlinePool = made;
  return made;
}

let made: Database | undefined;

/** The database of this process; the pool outlives hot reloads. */
export function database(): Database {
  made ??= drizzle(connectionPool(), { schema, mode: "planetscale" });
  return made;
}

/** Ends the pool, so that a plain process can finish. */
export async function closeDatabase(): Promise<void> {
  const open = kept.riverlinePool;
  delete kept.riverlinePool;
  made = undefined;
  await open?.end();
}
