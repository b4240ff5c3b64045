import "server-only";
import { and, eq, inArray } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import type { Reader } from "@/db/client";
import { records, recordVersions } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { tagOf } from "./citable-values";
import {
  chartTraverseIdsOf,
  CITED_VALUE,
  citedValuesOf,
  type DocumentNode,
  figureImageIdsOf,
} from "./document";

/**
 * The document with the printed text of every cited value taken from its source version, whatever
 * the browser sent.
 * @throws AppError INVALID when a value, figure or chart is not of this case
 */
export async function bindCitations(
  reader: Reader,
  caseId: string,
  document: DocumentNode,
): Promise<DocumentNode> {
  const cited = citedValuesOf(document);
  const versionIds = [...new Set(cited.map((value) => value.versionId))];
  const scopes = alias(records, "scopes");
  const rows =
    versionIds.length === 0
      ? []
      : await reader
          .select({
            versionId: recordVersions.id,
            recordId: records.id,
            kind: records.kind,
            label: records.label,
            scopeLabel: scopes.label,
            quotes: recordVersions.quotes,
          })
          .from(recordVersions)
          .innerJoin(records, eq(records.id, recordVersions.recordId))
          .leftJoin(scopes, eq(scopes.id, records.scopeId))
          .where(and(inArray(recordVersions.id, versionIds), eq(records.caseId, caseId)));
  const sources = new Map(rows.map((row) => [row.versionId, row]));
  await refuseForeign(reader, caseId, [
    ...figureImageIdsOf(document),
    ...chartTraverseIdsOf(document),
  ]);

  const bind = (node: DocumentNode): DocumentNode => {
    if (node.type === CITED_VALUE) {
      const source = sources.get(String(node.attrs?.versionId));
      const field = String(node.attrs?.field);
      const quote = source && Object.hasOwn(source.quotes, field) ? source.quotes[field] : null;
      if (!source || !quote || source.recordId !== node.attrs?.recordId) {
        throw new AppError(
          "INVALID",
          "A cited value is not from this case. The text was not saved; it is kept here. Take the value out and cite it again.",
        );
      }
      return {
        ...node,
        attrs: {
          ...node.attrs,
          text: quote.text,
          tag: tagOf(source.kind, source.label, source.scopeLabel),
        },
      };
    }
    return node.content ? { ...node, content: node.content.map(bind) } : node;
  };
  return bind(document);
}

async function refuseForeign(reader: Reader, caseId: string, recordIds: string[]): Promise<void> {
  const wanted = [...new Set(recordIds)];
  if (wanted.length === 0) return;
  const found = await reader
    .select({ id: records.id })
    .from(records)
    .where(and(inArray(records.id, wanted), eq(records.caseId, caseId)));
  if (found.length !== wanted.length) {
    throw new AppError(
      "INVALID",
      "A figure is not from this case. The text was not saved; it is kept here. Take the figure out and put it in again.",
    );
  }
}
