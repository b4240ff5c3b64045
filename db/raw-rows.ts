import type { SQL } from "drizzle-orm";
import { z } from "zod";
import type { Reader } from "./client";

/** Rows of hand-written SQL, each checked against a schema, since Drizzle cannot type them. */
export async function rawRows<S extends z.ZodType>(
  reader: Reader,
  query: SQL,
  row: S,
): Promise<z.infer<S>[]> {
  const [rows] = await reader.execute(query);
  return z.array(row).parse(rows);
}
