import "server-only";
import { database } from "@/db/client";
import type { Actor } from "@/lib/auth/actor";
import { decide } from "@/lib/auth/policy";
import { requireAllowed } from "@/lib/auth/require";
import { PUBLISHED_TABLES, type TableId } from "@/lib/hardness/published-tables";
import { enabledTableIds } from "./enabled-tables";

export type ReferenceTables = {
  tables: { id: TableId; isOn: boolean }[];
  maySwitch: boolean;
};

/** Every published table and whether this laboratory has it switched on. */
export async function listTables(actor: Actor): Promise<ReferenceTables> {
  requireAllowed(actor, "reference.view");
  const enabled = await enabledTableIds(database());
  return {
    tables: PUBLISHED_TABLES.map(({ id }) => ({ id, isOn: enabled.has(id) })),
    maySwitch: decide(actor, "reference.switch").allowed,
  };
}
