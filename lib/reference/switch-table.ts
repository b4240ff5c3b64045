import "server-only";
import { eq } from "drizzle-orm";
import { settings } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import { getTable, type TableId } from "@/lib/hardness/published-tables";
import { parseInput } from "@/lib/http/parse-input";
import { TABLES_SETTING } from "./constants";
import { enabledTableIds } from "./enabled-tables";
import { SwitchTableInput } from "./schemas";

/** Switches a conversion table on or off for the whole laboratory. Stored results keep theirs. */
export async function switchTable(
  actor: Actor,
  raw: unknown,
): Promise<{ tableId: TableId; isOn: boolean }> {
  requireAllowed(actor, "reference.switch");
  const { tableId, isOn } = parseInput(SwitchTableInput, raw);
  return transaction(async (tx) => {
    // The row is made first, so that two people at once wait for one another.
    const start = [...(await enabledTableIds(tx))].sort();
    await tx
      .insert(settings)
      .values({ name: TABLES_SETTING, value: start })
      .onDuplicateKeyUpdate({ set: { name: TABLES_SETTING } });
    await tx.select().from(settings).where(eq(settings.name, TABLES_SETTING)).for("update");
    const before = await enabledTableIds(tx);
    const wasOn = before.has(tableId);
    if (wasOn === isOn) return { tableId, isOn };
    const after = new Set(before);
    if (isOn) after.add(tableId);
    else after.delete(tableId);
    await tx
      .update(settings)
      .set({ value: [...after].sort(), changedAt: new Date() })
      .where(eq(settings.name, TABLES_SETTING));
    await recordEvent(tx, {
      caseId: null,
      actor,
      action: "reference.switch",
      subject: { kind: "table", id: tableId, label: getTable(tableId).title },
      before: { isOn: wasOn },
      after: { isOn },
    });
    return { tableId, isOn };
  });
}
