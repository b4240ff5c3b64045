import mysql from "mysql2/promise";
import { migrationsHash, migrate } from "./migrations";

const SLOTS = 32;
const MARKER = "_test_schema";

export interface Slot {
  databaseUrl: string;
  /** The schema was made just now, and the bucket is still to be made. */
  isNew: boolean;
  /** Lets the next file use what was made here. */
  remember(): Promise<void>;
  bucket: string;
  release(): Promise<void>;
}

/** The server for tests, without a schema. */
function serverUrl(): string {
  const url = process.env.TEST_DATABASE_SERVER_URL;
  if (url) return url;
  throw new Error(
    "These tests need a database, an object store and a mail sink. " +
      "Run them with: node scripts/test.mjs --only services [filter ...]",
  );
}

/**
 * A schema that no other test file uses at the moment, at the newest migration and without rows.
 * The server holds the claim as long as the connection lives, so a crashed run frees its schema.
 */
export async function takeSlot(): Promise<Slot> {
  const connection = await mysql.createConnection({ uri: serverUrl(), multipleStatements: true });
  const schema = await claim(connection);
  const databaseUrl = `${serverUrl()}/${schema}`;
  const isNew = (await schemaHash(connection, schema)) !== migrationsHash();
  if (isNew) {
    await connection.query(`drop database if exists \`${schema}\`; create database \`${schema}\``);
    await migrate(databaseUrl);
  } else {
    await emptyTables(connection, schema);
  }
  return {
    databaseUrl,
    bucket: schema.replaceAll("_", "-"),
    isNew,
    remember: () => writeMarker(connection, schema),
    release: () => connection.end(),
  };
}

async function claim(connection: mysql.Connection): Promise<string> {
  for (let slot = 1; slot <= SLOTS; slot += 1) {
    const schema = `riverline_test_${slot}`;
    const [rows] = await connection.query<mysql.RowDataPacket[]>("select get_lock(?, 0) as got", [
      schema,
    ]);
    if (rows[0]?.got === 1) return schema;
  }
  throw new Error(`All ${SLOTS} test schemas are in use.`);
}

async function writeMarker(connection: mysql.Connection, schema: string): Promise<void> {
  await connection.query(
    `create table \`${schema}\`.${MARKER} (hash char(64) not null);
     insert into \`${schema}\`.${MARKER} values (?)`,
    [migrationsHash()],
  );
}

async function schemaHash(connection: mysql.Connection, schema: string) {
  const [tables] = await connection.query<mysql.RowDataPacket[]>(
    "select 1 from information_schema.tables where table_schema = ? and table_name = ?",
    [schema, MARKER],
  );
  if (tables.length === 0) return undefined;
  const [rows] = await connection.query<mysql.RowDataPacket[]>(
    `select hash from \`${schema}\`.${MARKER}`,
  );
  return rows[0]?.hash as string | undefined;
}

/** TRUNCATE passes by the triggers that keep the audit log append-only. */
async function emptyTables(connection: mysql.Connection, schema: string): Promise<void> {
  const [tables] = await connection.query<mysql.RowDataPacket[]>(
    `select table_name as name from information_schema.tables
     where table_schema = ? and table_type = 'BASE TABLE' and table_name not in (?, '__drizzle_migrations')`,
    [schema, MARKER],
  );
  if (tables.length === 0) return;
  const full = (name: string) => `\`${schema}\`.\`${name}\``;
  const names = tables.map((table) => String(table.name));
  const questions = names.map(
    (name) => `select '${name}' as name from dual where exists (select 1 from ${full(name)})`,
  );
  const [filled] = await connection.query<mysql.RowDataPacket[]>(questions.join(" union all "));
  const statements = filled.map((table) => `truncate table ${full(String(table.name))}`);
  if (statements.length === 0) return;
  await connection.query(
    `set foreign_key_checks = 0; ${statements.join("; ")}; set foreign_key_checks = 1`,
  );
}
