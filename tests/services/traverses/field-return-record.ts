import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { records, recordVersions } from "@/db/schema";

export async function fieldReturnRecord(caseId: string) {
  const [row] = await database()
    .select({ recordId: records.id, content: recordVersions.content })
    .from(records)
    .innerJoin(recordVersions, eq(recordVersions.recordId, records.id))
    .where(and(eq(records.caseId, caseId), eq(records.kind, "field_return")));
  if (!row) throw new Error("there is no field return");
  return row;
}
