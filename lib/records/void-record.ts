import "server-only";
import { eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { records } from "@/db/schema";
import { AppError, notFound } from "@/lib/errors";

/** Withdraws a record, or puts it back. It stays visible; what rests on it turns stale. */
export async function setVoid(
  tx: Transaction,
  recordId: string,
  change: { isVoid: true; reason: string } | { isVoid: false },
): Promise<{ label: string }> {
  const [record] = await tx.select().from(records).where(eq(records.id, recordId)).for("update");
  if (!record) throw notFound();
  if ((record.state === "void") === change.isVoid) {
    throw new AppError(
      "CONFLICT",
      change.isVoid
        ? `${record.label} was withdrawn already.`
        : `${record.label} is in place already.`,
    );
  }
  await tx
    .update(records)
    .set(
      change.isVoid
        ? { state: "void", voidReason: change.reason }
        : { state: "recorded", voidReason: null },
    )
    .where(eq(records.id, recordId));
  return { label: record.label };
}
