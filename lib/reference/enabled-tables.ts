import "server-only";
import { eq } from "drizzle-orm";
import { z } from "zod";
import type { Reader } from "@/db/client";
import { settings } from "@/db/schema";
import {
  DEFAULT_ENABLED_TABLE_IDS,
  isTableId,
  type TableId,
} from "@/lib/hardness/published-tables";
import { TABLES_SETTING } from "./constants";

const setting = z.array(z.string());

/** The tables switched on at this laboratory; those shipped on until someone decides otherwise. */
export async function enabledTableIds(reader: Reader): Promise<ReadonlySet<TableId>> {
  const [row] = await reader
    .select({ value: settings.value })
    .from(settings)
    .where(eq(settings.name, TABLES_SETTING));
  return row ? new Set(setting.parse(row.value).filter(isTableId)) : DEFAULT_ENABLED_TABLE_IDS;
}
