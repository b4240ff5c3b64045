import {
  conversionPair,
  pairRange,
  readPair,
  type ConversionPair,
  type PairMarks,
} from "./conversion-pair";
import { rowWarnings, withScaleLimits, type ConversionWarning } from "./conversion-warnings";
import { editionText, type HardnessTable } from "./hardness-table";
import { MATERIAL_GROUPS, type MaterialGroup } from "./material-groups";
import { getTable, tablesInOrder, type TableId } from "./published-tables";
import { SCALES, type Scale } from "./scales";

export type ConversionRefusalCode =
  | "already_converted"
  | "no_table_for_material"
  | "cold_worked"
  | "table_of_another_group"
  | "table_switched_off"
  | "no_table_with_both_scales"
  | "same_scale"
  | "not_a_number"
  | "outside_range";

export type Conversion =
  | {
      readonly to: Scale;
      readonly status: "ok";
      readonly value: number;
      readonly table: TableId;
      readonly edition: string;
      readonly warnings: readonly ConversionWarning[];
    }
  | {
      readonly to: Scale;
      readonly status: "refused";
      readonly reason: string;
      readonly code: ConversionRefusalCode;
    };

/** Whether a value was read from an indent or already came out of a conversion. */
export type InputStatus = "measured" | "converted";

export interface ConversionRule {
  readonly materialGroup: MaterialGroup;
  readonly from: Scale;
  readonly to: Scale;
  /** A table asked for by name; without it the group's tables are asked in their order. */
  readonly tableId?: TableId;
  readonly enabledTableIds: ReadonlySet<TableId>;
  /** Set when a person decided, with a reason kept elsewhere, to use a steel table all the same. */
  readonly allowColdWorkedOverride?: boolean;
}

export type Converter = (value: number, inputStatus?: InputStatus) => Conversion;

interface Candidate {
  readonly id: TableId;
  readonly table: HardnessTable;
  readonly edition: string;
  readonly pair: ConversionPair;
  readonly warningsOf: (marks: PairMarks) => readonly ConversionWarning[];
}

/** Groups whose tables a person may use for cold-worked steel by override. */
const COLD_WORKED_SUBSTITUTES = ["steel-unalloyed-lowalloy", "steel-nonaustenitic"] as const;

function groupsServed(group: MaterialGroup): readonly MaterialGroup[] {
  return group === "steel-cold-worked" ? COLD_WORKED_SUBSTITUTES : [group];
}

const symbolOf = (scale: Scale) => SCALES[scale].symbol;
const withUnit = (value: number, scale: Scale) => `${value}\u00a0${symbolOf(scale)}`;

function refused(to: Scale, code: ConversionRefusalCode, reason: string): Conversion {
  return { to, status: "refused", reason, code };
}

/** What forbids every value of the request, whatever its size; `null` when nothing does. */
function refusalOfRule(rule: ConversionRule): Conversion | null {
  const { materialGroup, from, to, tableId } = rule;
  const group = MATERIAL_GROUPS[materialGroup];
  if (materialGroup === "steel-cold-worked") {
    if (!rule.allowColdWorkedOverride)
      return refused(to, "cold_worked", MATERIAL_GROUPS["steel-cold-worked"].noTable);
  } else if ("noTable" in group) {
    return refused(to, "no_table_for_material", group.noTable);
  }
  if (from === to) return refused(to, "same_scale", `The value is already in ${SCALES[to].name}.`);
  if (tableId === undefined) return null;
  const table = getTable(tableId);
  if (!groupsServed(materialGroup).includes(table.materialGroup)) {
    const other = MATERIAL_GROUPS[table.materialGroup].name;
    return refused(
      to,
      "table_of_another_group",
      `${table.title} holds for ${other}, not for ${group.name}.`,
    );
  }
  return rule.enabledTableIds.has(tableId) ? null : switchedOff(to, table);
}

function switchedOff(to: Scale, table: HardnessTable): Conversion {
  const reason = `${table.title} is switched off: its figures have not been compared with a copy of the standard.`;
  return refused(to, "table_switched_off", reason);
}

function candidatesOf(rule: ConversionRule): readonly Candidate[] {
  const ids = rule.tableId
    ? [rule.tableId]
    : groupsServed(rule.materialGroup).flatMap((group) => tablesInOrder(group));
  return ids.flatMap((id) => {
    const table = getTable(id);
    const pair = conversionPair(table, rule.from, rule.to);
    if (!pair) return [];
    const known = new Map<PairMarks, readonly ConversionWarning[]>();
    const warningsOf = (marks: PairMarks) => {
      const warnings = known.get(marks) ?? rowWarnings(rule.materialGroup, table, marks);
      known.set(marks, warnings);
      return warnings;
    };
    return [{ id, table, edition: editionText(table), pair, warningsOf }];
  });
}

/** A table of the neighbouring steel group that would answer, offered but never used unasked. */
function alternativeText(rule: ConversionRule, value: number): string {
  if (rule.materialGroup !== "steel-unalloyed-lowalloy") return "";
  const other = tablesInOrder("steel-nonaustenitic").find((id) => {
    const pair = rule.enabledTableIds.has(id) && conversionPair(getTable(id), rule.from, rule.to);
    return pair && readPair(pair, value) !== null;
  });
  if (!other) return "";
  const { standard, tableNumber } = getTable(other);
  return ` ${standard} ${tableNumber} has it, for non-austenitic steel.`;
}

function outsideRange(rule: ConversionRule, first: Candidate, value: number): Conversion {
  const { min, max } = pairRange(first.pair);
  const { standard, tableNumber } = first.table;
  const reason =
    `${withUnit(value, rule.from)} is outside ${standard} ${tableNumber}, which gives ` +
    `${symbolOf(rule.to)} from ${min} to ${withUnit(max, rule.from)}.` +
    alternativeText(rule, value);
  return refused(rule.to, "outside_range", reason);
}

function missingPair(rule: ConversionRule, all: readonly Candidate[]): Conversion {
  const [off] = all;
  if (off) return switchedOff(rule.to, off.table);
  const where = rule.tableId
    ? `${getTable(rule.tableId).title} does not hold`
    : `No table for ${MATERIAL_GROUPS[rule.materialGroup].name} holds`;
  const scales = `both ${SCALES[rule.from].name} and ${SCALES[rule.to].name}`;
  return refused(rule.to, "no_table_with_both_scales", `${where} ${scales}.`);
}

/**
 * Makes the function that converts one value after another by the same rule.
 *
 * Straight line between neighbouring rows of one published table in which both scales are filled;
 * never beyond a table's end, never through a second table, never from a converted value. The value
 * is not rounded. Linear interpolation is this product's choice; the standards leave it open.
 * Sources of the figures: `source` of each file in ./tables.
 */
export function converterFor(rule: ConversionRule): Converter {
  const { to } = rule;
  const always = refusalOfRule(rule);
  const all = always ? [] : candidatesOf(rule);
  const candidates = all.filter(({ id }) => rule.enabledTableIds.has(id));
  const [first] = candidates;

  return (value, inputStatus = "measured") => {
    if (inputStatus === "converted")
      return refused(
        to,
        "already_converted",
        "The value was converted already. A conversion starts from a measured value; nothing converts twice.",
      );
    if (always) return always;
    if (!Number.isFinite(value)) return refused(to, "not_a_number", "The value is not a number.");
    if (!first) return missingPair(rule, all);
    for (const { id, edition, pair, warningsOf } of candidates) {
      const reading = readPair(pair, value);
      if (!reading) continue;
      const warnings = withScaleLimits(rule, value, reading.value, warningsOf(reading.marks));
      return { to, status: "ok", value: reading.value, table: id, edition, warnings };
    }
    return outsideRange(rule, first, value);
  };
}

/** Converts one value; see `converterFor`, which is faster for a series. */
export function convert(
  input: ConversionRule & { readonly value: number; readonly inputStatus?: InputStatus },
): Conversion {
  return converterFor(input)(input.value, input.inputStatus);
}
