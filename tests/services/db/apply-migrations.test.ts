import { spawn } from "node:child_process";
import { once } from "node:events";
import { setTimeout as sleep } from "node:timers/promises";
import mysql from "mysql2/promise";
import { afterAll, beforeAll, expect, it } from "vitest";

const SERVER = process.env.TEST_DATABASE_SERVER_URL ?? "";
const CUT = `riverline_test_cut_${process.pid}`;
const WHOLE = `riverline_test_whole_${process.pid}`;
let connection: mysql.Connection;

beforeAll(async () => {
  connection = await mysql.createConnection(SERVER);
  for (const schema of [CUT, WHOLE]) await connection.query(`create database ${schema}`);
});
afterAll(async () => {
  for (const schema of [CUT, WHOLE]) await connection.query(`drop database ${schema}`);
  await connection.end();
});

/** Runs the migration, and kills it after a while; answers whether it came to its end. */
async function migrateFor(ms: number, schema = CUT): Promise<boolean> {
  const args = ["--conditions=react-server", "--import", "tsx", "db/migrate.ts"];
  const env = { ...process.env, DATABASE_URL: `${SERVER}/${schema}` };
  const child = spawn(process.execPath, args, { env, stdio: ["ignore", "ignore", "inherit"] });
  const exit = once(child, "exit");
  const killer = new AbortController();
  void sleep(ms, undefined, { signal: killer.signal }).then(
    () => child.kill("SIGKILL"),
    () => undefined,
  );
  const [code, signal] = (await exit) as [number | null, NodeJS.Signals | null];
  killer.abort();
  if (signal !== "SIGKILL") expect(code).toBe(0);
  return code === 0;
}

async function tablesOf(schema: string) {
  const [rows] = await connection.query<mysql.RowDataPacket[]>(
    `select table_name, column_name, column_type, is_nullable, column_key
     from information_schema.columns
     where table_schema = ? order by 1, 2`,
    [schema],
  );
  return rows;
}

async function triggersOf(schema: string) {
  const [rows] = await connection.query<mysql.RowDataPacket[]>(
    "select trigger_name from information_schema.triggers where trigger_schema = ? order by 1",
    [schema],
  );
  return rows;
}

async function countIn(schema: string, table: string): Promise<number> {
  const [rows] = await connection.query<mysql.RowDataPacket[]>(
    "select 1 from information_schema.tables where table_schema = ? and table_name = ?",
    [schema, table],
  );
  if (rows.length === 0) return 0;
  const [counted] = await connection.query<mysql.RowDataPacket[]>(
    `select count(*) as n from ${schema}.${table}`,
  );
  return Number(counted[0]?.n);
}

it("a migration that is killed again and again ends as one that ran through", async () => {
  let finished = false;
  let seenHalfDone = 0;
  // The window moves over the migration: process start takes a few tenths of a second.
  for (let ms = 200; !finished && ms < 20_000; ms += 60) {
    finished = await migrateFor(ms);
    seenHalfDone += await countIn(CUT, "__migration_progress");
  }
  expect(finished).toBe(true);
  expect(seenHalfDone).toBeGreaterThan(0);
  expect(await migrateFor(60_000, WHOLE)).toBe(true);
  expect(await tablesOf(CUT)).toEqual(await tablesOf(WHOLE));
  expect(await triggersOf(CUT)).toEqual(await triggersOf(WHOLE));
  expect(await countIn(CUT, "__migration_progress")).toBe(0);
}, 120_000);
