import type { MaterialGroup } from "./material-groups";
import type { Scale } from "./scales";

/**
 * How far the figures of a table or a column can be trusted.
 * A: compared cell by cell with several reprints. B: partly compared, the rest from memory but
 * passing internal checks. C: memory only; shipped switched off until someone has compared it with
 * a copy of the standard.
 */
export type Tier = "A" | "B" | "C";

/** Rows named by their value in the key column, for each scale that has any. */
export type MarkedRows = Partial<Record<Scale, readonly number[]>>;

/** One published conversion table. All columns have as many rows as the key column. */
export interface HardnessTable {
  readonly id: string;
  readonly title: string;
  readonly standard: string;
  readonly tableNumber: string;
  readonly edition: string;
  readonly materialGroup: MaterialGroup;
  /** In words, what the standard says the table holds for. */
  readonly holdsFor: string;
  /** The column that names a row. */
  readonly keyScale: Scale;
  readonly tier: Tier;
  /** Columns that stand better or worse than the table as a whole. */
  readonly tierByScale?: Partial<Record<Scale, Tier>>;
  readonly enabledByDefault: boolean;
  /** Where the figures come from and how they were compared. */
  readonly source: string;
  /** Day of the comparison. */
  readonly checked: string;
  /** Single figures to look up when a copy of the standard is at hand. */
  readonly doubts: readonly string[];
  readonly caution: string;
  /** An empty cell is `null`; it is never filled. */
  readonly columns: Partial<Record<Scale, readonly (number | null)[]>>;
  /** Values that the standard prints in parentheses: outside the usual range of that test. */
  readonly parentheses: MarkedRows;
  /** Scales whose parentheses have another meaning, given here, and cause no warning. */
  readonly parenthesesWithoutWarning?: Partial<Record<Scale, string>>;
  /** Cells that no reprint confirms. */
  readonly unconfirmed: "all" | MarkedRows;
}

/** Standard, edition and table as an answer or a report names them. */
export function editionText(table: HardnessTable): string {
  return `${table.standard} (${table.edition}), ${table.tableNumber}`;
}
