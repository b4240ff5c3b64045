import "server-only";
import { asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { organisations } from "@/db/schema";

export type Laboratory = { id: string; name: string; addressLine: string | null };

/** The laboratory this installation belongs to; null before it is set up. */
export async function laboratory(): Promise<Laboratory | null> {
  const [row] = await database()
    .select({
      id: organisations.id,
      name: organisations.name,
      addressLine: organisations.addressLine,
    })
    .from(organisations)
    .where(eq(organisations.kind, "laboratory"))
    .orderBy(asc(organisations.madeAt))
    .limit(1);
  return row ?? null;
}
