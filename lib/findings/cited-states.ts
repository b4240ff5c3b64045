import "server-only";
import { and, desc, eq, inArray } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { people, records, recordVersions } from "@/db/schema";
import { staleVersionIds } from "@/lib/records/stale";
import { citedValuesOf, type DocumentNode } from "./document";

export type CitedState = {
  recordId: string;
  versionId: string;
  field: string;
  state: "current" | "stale" | "kept" | "withdrawn";
  /** What the source says now; null when it says nothing of this field any more. */
  now: { versionId: string; text: string; by: string; at: string; reason: string | null } | null;
};

/** Where each cited value of a document stands against its source. */
export async function citedStates(reader: Reader, document: DocumentNode): Promise<CitedState[]> {
  const cited = citedValuesOf(document);
  if (cited.length === 0) return [];
  const recordIds = [...new Set(cited.map((value) => value.recordId))];
  const [stale, rows] = await Promise.all([
    staleVersionIds(
      reader,
      cited.map((value) => value.versionId),
    ),
    reader
      .select({
        recordId: records.id,
        state: records.state,
        versionId: recordVersions.id,
        quotes: recordVersions.quotes,
        by: people.name,
        at: recordVersions.madeAt,
        reason: recordVersions.reason,
      })
      .from(records)
      .innerJoin(
        recordVersions,
        and(
          eq(recordVersions.recordId, records.id),
          eq(recordVersions.number, records.latestVersion),
        ),
      )
      .innerJoin(people, eq(people.id, recordVersions.madeById))
      .where(inArray(records.id, recordIds))
      .orderBy(desc(recordVersions.madeAt)),
  ]);
  const latest = new Map(rows.map((row) => [row.recordId, row]));
  return cited.map((value) => {
    const source = latest.get(value.recordId);
    const quote =
      source && Object.hasOwn(source.quotes, value.field) ? source.quotes[value.field] : null;
    const now =
      source && quote
        ? {
            versionId: source.versionId,
            text: quote.text,
            by: source.by,
            at: source.at.toISOString(),
            reason: source.reason,
          }
        : null;
    const isWithdrawn = !source || source.state === "void" || now === null;
    const state = isWithdrawn
      ? "withdrawn"
      : !stale.has(value.versionId)
        ? "current"
        : value.keptReason !== null
          ? "kept"
          : "stale";
    return { recordId: value.recordId, versionId: value.versionId, field: value.field, state, now };
  });
}
