import { getTable, type TableId } from "@/lib/hardness/published-tables";
import { evaluateTraverse, type TraverseDepth } from "@/lib/hardness/traverse-evaluation";
import { conversionColumns, convertedHardness, type ConversionColumn } from "./conversion-columns";
import type { ResultContent, TraverseContent } from "./schemas";
import { traverseInputOf } from "./traverse-input-of";
import { cellProblems } from "./typed-cells";

/** A list of problems is read by people; past this many the count says it. */
const PROBLEMS_LISTED = 50;

const convertAll = (columns: readonly ConversionColumn[], hardness: number | null) =>
  hardness === null
    ? []
    : columns.map(({ convert }) => convertedHardness(convert(hardness), hardness));

/** "indents 10 and 11"; null where it is about the traverse as a whole. */
function whereText(
  readings: readonly { readonly id: string; readonly number: number }[],
  ids: readonly string[],
): string | null {
  if (ids.length === 0 || ids.length > 2) return null;
  const numbers = readings.flatMap(({ id, number }) => (ids.includes(id) ? [number] : []));
  return `${numbers.length === 1 ? "indent" : "indents"} ${numbers.join(" and ")}`;
}

function depthOf(found: TraverseDepth | null): ResultContent["depth"] {
  if (!found) return null;
  const { depth, limit } = found;
  const hasDepth = depth.verdict === "ok" || depth.verdict === "warn";
  const reason =
    depth.verdict === "refuse"
      ? depth.reason
      : depth.verdict === "not_reached"
        ? "No reading reaches the limit. The depth was not found."
        : depth.verdict === "beyond_last_reading"
          ? `The hardness stays above the limit to the deepest reading at ${depth.deepestMm}\u00a0mm.`
          : null;
  return {
    kind: found.kind,
    limit: limit?.limit ?? null,
    limitBasis: limit?.basis ?? null,
    depthMm: hasDepth ? depth.depthMm : null,
    expandedUncertaintyMm: found.expandedUncertaintyMm,
    uncertaintyStatement: found.uncertaintyStatement,
    reason,
    restsOn: [...found.restsOn],
    requirement: found.requirement,
  };
}

/**
 * Everything that follows from a traverse as typed: the same function previews it on the screen and
 * makes the stored result.
 */
export function evaluateContent(
  content: TraverseContent,
  made: { traverseId: string; traverseLabel: string; enabledTableIds: ReadonlySet<TableId> },
): ResultContent {
  const evaluation = evaluateTraverse(traverseInputOf(content));
  const columns = conversionColumns(content, made.enabledTableIds);
  const problems = cellProblems(content.readings);
  const misread = problems.slice(0, PROBLEMS_LISTED).map(({ number, text, readingId }) => ({
    code: "cell",
    level: "must" as const,
    text: `Indent ${number}: ${text}`,
    readingIds: [readingId],
  }));
  if (problems.length > PROBLEMS_LISTED)
    misread.push({
      code: "cell",
      level: "must",
      text: `${problems.length - PROBLEMS_LISTED} more cells cannot be read.`,
      readingIds: [],
    });
  const named = new Set(problems.map(({ readingId }) => readingId));
  const found = evaluation.items
    // A cell that cannot be read is told once, in its own words.
    .filter(
      ({ code, readingIds }) =>
        !(
          ["no_depth", "no_hardness", "one_diagonal_missing"].includes(code) &&
          readingIds.every((id) => named.has(id))
        ),
    )
    .map((item) => ({ ...item, readingIds: [...item.readingIds] }));
  const items = [...misread, ...found];
  const { surface, core } = evaluation;
  const atSurface = surface.mean
    ? {
        value: surface.mean.mean,
        expandedUncertainty: surface.mean.expandedUncertainty,
        readingIds: [...surface.mean.readingIds],
      }
    : {
        value: surface.shallowest?.hardness ?? null,
        expandedUncertainty: surface.shallowest?.expandedUncertainty ?? null,
        readingIds: surface.shallowest ? [surface.shallowest.readingId] : [],
      };
  const hasConversions = columns.length > 0;
  return {
    traverseId: made.traverseId,
    traverseLabel: made.traverseLabel,
    symbol: evaluation.symbol,
    hasConversions,
    tableTitles: content.tableId === null || !hasConversions ? [] : [tableTitle(content.tableId)],
    unsettled: items
      .filter(({ level }) => level === "must")
      .map(({ readingIds, text }) => whereText(evaluation.readings, readingIds) ?? text),
    readings: evaluation.readings.map((reading) => ({
      id: reading.id,
      number: reading.number,
      depthMm: reading.depthMm,
      hardness: reading.hardness,
      expandedUncertainty: reading.expandedUncertainty,
      isInCurve: reading.isInCurve,
      conversions: reading.isInCurve ? convertAll(columns, reading.hardness) : [],
    })),
    depth: depthOf(evaluation.depth),
    surface: {
      ...atSurface,
      remark: null,
      conversions: convertAll(columns, atSurface.value),
      requirement: surface.requirement,
    },
    core: {
      value: core.hardness,
      expandedUncertainty: core.expandedUncertainty,
      readingIds: [...core.readingIds],
      remark: core.remark,
      conversions: convertAll(columns, core.hardness),
      requirement: core.requirement,
    },
    items,
  };
}

/** "ISO 18265 Table A.1", as it stands behind every converted value. */
export function tableTitle(tableId: TableId): string {
  const { standard, tableNumber } = getTable(tableId);
  return `${standard} ${tableNumber}`;
}
