import "server-only";
import { and, eq } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { records } from "@/db/schema";
import { AppError } from "@/lib/errors";

/** @throws AppError INVALID at `field` when a picture would show an item of another case */
export async function checkItem(
  reader: Reader,
  caseId: string,
  itemId: string | null | undefined,
  field: string,
): Promise<void> {
  if (!itemId) return;
  const [item] = await reader
    .select({ id: records.id })
    .from(records)
    .where(and(eq(records.id, itemId), eq(records.caseId, caseId), eq(records.kind, "item")));
  if (item) return;
  throw new AppError("INVALID", undefined, { fields: { [field]: "Choose an item of this case." } });
}
