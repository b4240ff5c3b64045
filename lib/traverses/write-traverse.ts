import "server-only";
import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { records, recordVersions, traverseReadings } from "@/db/schema";
import { AppError, notFound } from "@/lib/errors";
import { getTable, type TableId } from "@/lib/hardness/published-tables";
import type { VersionContent, WrittenVersion } from "@/lib/records/write-version";
import { enabledTableIds } from "@/lib/reference/enabled-tables";
import { evaluateContent, tableTitle } from "./evaluate-content";
import { latestReturn } from "./read-traverses";
import { resultQuotes } from "./result-quotes";
import type { TraverseContent } from "./schemas";
import { readCell } from "./typed-cells";

/** Rows of one insert: MariaDB takes at most 65 535 placeholders. */
const ROWS_AT_ONCE = 1000;

/** @throws AppError INVALID when the piece or a table asked for anew is not to be had */
export async function checkChoices(
  tx: Transaction,
  caseId: string,
  content: TraverseContent,
  before: TraverseContent | null,
): Promise<void> {
  const fields: Record<string, string> = {};
  if (content.itemId !== null && content.itemId !== before?.itemId) {
    const [item] = await tx
      .select({ id: records.id })
      .from(records)
      .where(
        and(eq(records.id, content.itemId), eq(records.caseId, caseId), eq(records.kind, "item")),
      );
    if (!item) fields["content.itemId"] = "Choose an item of this case.";
  }
  const { tableId } = content;
  if (tableId !== null && tableId !== before?.tableId) {
    const problem = await tableProblem(tx, tableId, content);
    if (problem) fields["content.tableId"] = problem;
  }
  if (Object.keys(fields).length > 0) throw new AppError("INVALID", undefined, { fields });
}

async function tableProblem(tx: Transaction, tableId: TableId, content: TraverseContent) {
  const enabled = await enabledTableIds(tx);
  if (!enabled.has(tableId))
    return `${tableTitle(tableId)} is switched off at this laboratory. Choose another table.`;
  const { materialGroup, title } = getTable(tableId);
  return materialGroup === content.materialGroup || content.materialGroup === "steel-cold-worked"
    ? null
    : `${title} does not hold for this material group. Choose another table.`;
}

/** Writes the typed rows of a version; a row without a depth that can be read stays in its content. */
export async function writeReadings(
  tx: Transaction,
  written: WrittenVersion,
  content: TraverseContent,
): Promise<void> {
  const rows = content.readings.flatMap((reading, index) => {
    const depthMm = readCell("depth", reading.depth).value;
    if (depthMm === null) return [];
    return [
      {
        versionId: written.versionId,
        recordId: written.recordId,
        position: index + 1,
        depthMm,
        d1Um: readCell("d1", reading.d1).value,
        d2Um: readCell("d2", reading.d2).value,
        enteredHardness: readCell("hardness", reading.hardness).value,
        lateralMm: readCell("lateral", reading.lateral).value,
        track: readCell("track", reading.track).value,
        isLeftOut: reading.leftOutReason !== undefined,
        leftOutReason: reading.leftOutReason ?? null,
        keptReason: reading.keptReason ?? null,
      },
    ];
  });
  for (let from = 0; from < rows.length; from += ROWS_AT_ONCE)
    await tx.insert(traverseReadings).values(rows.slice(from, from + ROWS_AT_ONCE));
}

/** The result of a traverse as it is stored, with what it was made from. */
export async function resultVersion(
  tx: Transaction,
  caseId: string,
  traverse: { traverseId: string; label: string; versionId: string; content: TraverseContent },
): Promise<VersionContent & { inputs: readonly string[] }> {
  const { content, traverseId, label, versionId } = traverse;
  const result = evaluateContent(content, {
    traverseId,
    traverseLabel: label,
    enabledTableIds: await enabledTableIds(tx),
  });
  const fieldReturn = content.isRequirementFromReturn ? await latestReturn(tx, caseId) : null;
  const { depth } = result;
  return {
    content: result,
    quotes: resultQuotes(result, content.name),
    headline:
      depth && depth.depthMm !== null
        ? { value: depth.depthMm, unit: "mm", expandedUncertainty: depth.expandedUncertaintyMm }
        : null,
    method: {
      name: `${result.symbol} traverse${depth ? `, ${depth.kind} (ISO 18203)` : ""}`,
      version: "1",
    },
    inputs: [versionId, ...(fieldReturn ? [fieldReturn.versionId] : [])],
  };
}

/** Content as the history keeps it: the typed rows stand in the version itself. */
export function eventContent(content: TraverseContent, version: number) {
  const { readings, ...settings } = content;
  return { ...settings, readings: readings.length, version };
}

export type TraverseHead = {
  label: string;
  versionId: string;
  version: number;
  content: unknown;
  resultId: string;
};

/** @throws AppError NOT_FOUND when the case has no such traverse */
export async function findTraverse(
  tx: Transaction,
  caseId: string,
  traverseId: string,
): Promise<TraverseHead> {
  const [head] = await tx
    .select({
      label: records.label,
      version: records.latestVersion,
      versionId: recordVersions.id,
      content: recordVersions.content,
    })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(
      and(eq(records.id, traverseId), eq(records.caseId, caseId), eq(records.kind, "traverse")),
    );
  const [result] = await tx
    .select({ id: records.id })
    .from(records)
    .where(and(eq(records.scopeId, traverseId), eq(records.kind, "hardness_result")));
  if (!head || !result) throw notFound();
  return { ...head, resultId: result.id };
}
