import "server-only";
import { asc, eq, inArray } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import type { Reader } from "@/db/client";
import { recordEdges, records, recordVersions } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { tagOf } from "@/lib/findings/citable-values";
import {
  chartTraverseIdsOf,
  citedValuesOf,
  type DocumentNode,
  figureImageIdsOf,
} from "@/lib/findings/document";
import { closureOf } from "@/lib/records/stale";
import { versionDigest } from "@/lib/records/write-version";
import type { FrozenReport } from "./frozen-report";

/** Versions a document rests on: cited ones, and the latest of each figure, its marks and scale, and chart. */
async function roots(reader: Reader, document: DocumentNode): Promise<string[]> {
  const shown = [...figureImageIdsOf(document), ...chartTraverseIdsOf(document)];
  const rows =
    shown.length === 0
      ? []
      : await reader
          .select({
            versionId: recordVersions.id,
            number: recordVersions.number,
            latest: records.latestVersion,
            state: records.state,
          })
          .from(records)
          .innerJoin(recordVersions, eq(recordVersions.recordId, records.id))
          .where(inArray(records.scopeId, shown));
  const own =
    shown.length === 0
      ? []
      : await reader
          .select({
            versionId: recordVersions.id,
            number: recordVersions.number,
            latest: records.latestVersion,
            state: records.state,
          })
          .from(records)
          .innerJoin(recordVersions, eq(recordVersions.recordId, records.id))
          .where(inArray(records.id, shown));
  const latest = [...rows, ...own].filter(
    (row) => row.number === row.latest && row.state !== "void",
  );
  return [
    ...citedValuesOf(document).map((value) => value.versionId),
    ...latest.map((row) => row.versionId),
  ];
}

/**
 * The versions under a document with their digests, each worked out again from what is stored.
 * @throws AppError INVALID naming a version whose stored digest does not fit its content
 */
export async function manifestOf(
  reader: Reader,
  document: DocumentNode,
): Promise<FrozenReport["manifest"]> {
  const ids = await closureOf(reader, await roots(reader, document));
  if (ids.length === 0) return [];
  const scopes = alias(records, "scopes");
  const [rows, edges] = await Promise.all([
    reader
      .select({
        version: recordVersions,
        kind: records.kind,
        label: records.label,
        scopeLabel: scopes.label,
      })
      .from(recordVersions)
      .innerJoin(records, eq(records.id, recordVersions.recordId))
      .leftJoin(scopes, eq(scopes.id, records.scopeId))
      .where(inArray(recordVersions.id, ids))
      .orderBy(asc(recordVersions.id)),
    reader.select().from(recordEdges).where(inArray(recordEdges.versionId, ids)),
  ]);
  return rows.map(({ version, kind, label, scopeLabel }) => {
    const tag = tagOf(kind, label, scopeLabel);
    const digest = versionDigest({
      content: version.content,
      quotes: version.quotes,
      method:
        version.method === null
          ? null
          : { name: version.method, version: version.methodVersion ?? "" },
      inputs: edges
        .filter((edge) => edge.versionId === version.id)
        .map((edge) => edge.inputVersionId)
        .sort(),
    });
    if (digest !== version.sha256) {
      throw new AppError(
        "INVALID",
        `${tag}, version ${version.number}, is not as it was written. Nothing was signed. Tell the administrator.`,
      );
    }
    return { label: tag, kind, version: version.number, sha256: version.sha256 };
  });
}
