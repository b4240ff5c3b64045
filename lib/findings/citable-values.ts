import "server-only";
import { and, asc, eq, ne } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import type { Reader } from "@/db/client";
import { records, recordVersions } from "@/db/schema";
import type { RecordKind, ValueSource } from "@/lib/records/constants";

export type CitableGroup =
  "Field return" | "Images" | "Hardness" | "Strength" | "Weighing" | "Items";
export type Citable = {
  group: CitableGroup;
  recordId: string;
  versionId: string;
  field: string;
  label: string;
  text: string;
  /** Where it comes from, as people say it: "T2", "A1 · IM-03". */
  tag: string;
  source: ValueSource;
};

const GROUP: Record<RecordKind, CitableGroup | null> = {
  field_return: "Field return",
  item: "Items",
  image: null,
  calibration: "Images",
  mark: "Images",
  traverse: null,
  hardness_result: "Hardness",
  strength_statement: "Strength",
  mechanism: "Weighing",
  second_reading: null,
};

/** Label of a record with the label of what it is part of, where that is another record. */
export function tagOf(kind: RecordKind, label: string, scopeLabel: string | null): string {
  return scopeLabel !== null && (kind === "mark" || kind === "calibration")
    ? `${label} · ${scopeLabel}`
    : label;
}

/** Every value of a case that a text can cite, latest versions only, by station. */
export async function citableValues(reader: Reader, caseId: string): Promise<Citable[]> {
  const scopes = alias(records, "scopes");
  const rows = await reader
    .select({
      recordId: records.id,
      versionId: recordVersions.id,
      kind: records.kind,
      label: records.label,
      scopeLabel: scopes.label,
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
    .leftJoin(scopes, eq(scopes.id, records.scopeId))
    .where(and(eq(records.caseId, caseId), ne(records.state, "void")))
    .orderBy(asc(records.madeAt), asc(records.id));
  return rows.flatMap((row) => {
    const group = GROUP[row.kind];
    if (group === null) return [];
    return Object.entries(row.quotes).map(([field, quote]) => ({
      group,
      recordId: row.recordId,
      versionId: row.versionId,
      field,
      label: quote.label,
      text: quote.text,
      tag: tagOf(row.kind, row.label, row.scopeLabel),
      source: quote.source,
    }));
  });
}
