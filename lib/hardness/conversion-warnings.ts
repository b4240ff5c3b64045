import type { Notice } from "../numerics/verdict";
import type { PairMarks } from "./conversion-pair";
import type { HardnessTable } from "./hardness-table";
import type { MaterialGroup } from "./material-groups";
import { scaleLimitWarning, type Scale } from "./scales";

export type ConversionWarningCode =
  | "printed_in_parentheses"
  | "unconfirmed"
  | "interpolated_over_empty_cell"
  | "outside_scale_limits"
  | "cold_worked_override";

export type ConversionWarning = Notice<ConversionWarningCode>;

/** Warnings that depend on the rows alone, and so are the same for every value between them. */
export function rowWarnings(
  materialGroup: MaterialGroup,
  table: HardnessTable,
  marks: PairMarks,
): readonly ConversionWarning[] {
  const warnings: ConversionWarning[] = [];
  const warn = (code: ConversionWarningCode, text: string) => warnings.push({ code, text });
  if (marks.parenthesised)
    warn(
      "printed_in_parentheses",
      "Printed in parentheses in the table: outside the usual range of that test, for information only.",
    );
  if (marks.unconfirmed) warn("unconfirmed", `Not confirmed against a copy of ${table.standard}.`);
  if (marks.overEmptyCell)
    warn(
      "interpolated_over_empty_cell",
      "A cell of the table is empty here: interpolated between the nearest filled rows.",
    );
  if (materialGroup === "steel-cold-worked")
    warn(
      "cold_worked_override",
      "Cold-worked steel can lie far from this table; used by override.",
    );
  return warnings;
}

/** Adds the warnings of the scales themselves; the shared list when there is none. */
export function withScaleLimits(
  rule: { readonly from: Scale; readonly to: Scale },
  value: number,
  converted: number,
  warnings: readonly ConversionWarning[],
): readonly ConversionWarning[] {
  const from = scaleLimitWarning(rule.from, value);
  const to = scaleLimitWarning(rule.to, converted);
  if (from === null && to === null) return warnings;
  const limits = [from, to].filter((text) => text !== null);
  return [...warnings, ...limits.map((text) => ({ code: "outside_scale_limits" as const, text }))];
}
