import "server-only";
import { and, asc, eq, inArray, ne } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { records, recordVersions } from "@/db/schema";
import type { RecordKind, ValueSource } from "./constants";

export type CitableEntry = {
  recordId: string;
  versionId: string;
  field: string;
  label: string;
  text: string;
  tag: string;
  source: ValueSource;
};

/** Quotable fields of the latest versions of the given kinds, in the order they were made. */
export async function citableValues(
  reader: Reader,
  caseId: string,
  kinds: RecordKind[],
): Promise<CitableEntry[]> {
  const rows = await reader
    .select({
      recordId: records.id,
      versionId: recordVersions.id,
      label: records.label,
      quotes: recordVersions.quotes,
    })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(and(eq(records.caseId, caseId), inArray(records.kind, kinds), ne(records.state, "void")))
    .orderBy(asc(records.madeAt), asc(records.id));
  return rows.flatMap((row) =>
    Object.entries(row.quotes).map(([field, quote]) => ({
      recordId: row.recordId,
      versionId: row.versionId,
      field,
      label: quote.label,
      text: quote.text,
      tag: row.label,
      source: quote.source,
    })),
  );
}
