import { formatNumber } from "@/lib/format/numbers";
import { converterFor, type Conversion, type Converter } from "@/lib/hardness/convert";
import type { MaterialGroup } from "@/lib/hardness/material-groups";
import { getTable, PUBLISHED_TABLES, type TableId } from "@/lib/hardness/published-tables";
import type { Scale } from "@/lib/hardness/scales";
import type { HardnessMethod } from "./constants";
import type { ConvertedHardness, TraverseContent } from "./schemas";

/** Scales shown beside the measured one, at most one of hardness and the strength. */
const HARDNESS_SCALES: readonly Scale[] = ["HRC", "HRB", "HRF", "HBW_3000", "HB_500"];

export const measuredScale = (method: HardnessMethod): Scale =>
  method === "vickers" ? "HV" : "HK";

/** What a table gives for values of `from`; empty where it does not hold that scale. */
export function targetsOf(tableId: TableId, from: Scale): readonly Scale[] {
  const { columns } = getTable(tableId);
  if (!columns[from]) return [];
  const hardness = HARDNESS_SCALES.find((scale) => columns[scale]);
  return [...(hardness ? [hardness] : []), ...(columns.Rm_MPa ? (["Rm_MPa"] as const) : [])];
}

/** Tables that a traverse of this group and method can be converted by. */
export function tablesFor(
  group: MaterialGroup,
  method: HardnessMethod,
  enabled: ReadonlySet<TableId>,
): readonly TableId[] {
  return PUBLISHED_TABLES.filter(
    (table) =>
      table.materialGroup === group &&
      enabled.has(table.id) &&
      targetsOf(table.id, measuredScale(method)).length > 0,
  ).map(({ id }) => id);
}

export type ConversionColumn = { to: Scale; convert: Converter };

export function conversionColumns(
  content: Pick<TraverseContent, "tableId" | "materialGroup" | "method">,
  enabledTableIds: ReadonlySet<TableId>,
): readonly ConversionColumn[] {
  const { tableId, materialGroup, method } = content;
  if (tableId === null) return [];
  const from = measuredScale(method);
  return targetsOf(tableId, from).map((to) => ({
    to,
    convert: converterFor({ materialGroup, from, to, tableId, enabledTableIds }),
  }));
}

/** A refusal names the value it was asked for; it is shown as a report writes it. */
export function convertedHardness(conversion: Conversion, asked: number): ConvertedHardness {
  return conversion.status === "ok"
    ? {
        to: conversion.to,
        value: conversion.value,
        remarks: conversion.warnings.map(({ text }) => text),
      }
    : {
        to: conversion.to,
        value: null,
        remarks: [conversion.reason.replace(String(asked), formatNumber(asked, { decimals: 0 }))],
      };
}
