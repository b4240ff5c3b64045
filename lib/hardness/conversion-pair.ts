import { lastAtOrBelow } from "../numerics/bisect";
import type { HardnessTable, MarkedRows } from "./hardness-table";
import type { Scale } from "./scales";

/** Two columns of one table made ready for reading: rows where both are filled, ascending. */
export interface ConversionPair {
  readonly from: readonly number[];
  readonly to: readonly number[];
  /** For each row: its place in the table, to notice rows that were skipped. */
  readonly rowIndex: readonly number[];
  readonly parenthesised: readonly boolean[];
  readonly unconfirmed: readonly boolean[];
}

export interface PairReading {
  readonly value: number;
  /** The two rows do not stand next to one another in the table: a cell between them is empty. */
  readonly overEmptyCell: boolean;
  readonly parenthesised: boolean;
  readonly unconfirmed: boolean;
}

function isMarked(marks: MarkedRows, scales: readonly Scale[], key: number | null): boolean {
  return key !== null && scales.some((scale) => marks[scale]?.includes(key) === true);
}

function buildPair(table: HardnessTable, from: Scale, to: Scale): ConversionPair | null {
  const fromColumn = table.columns[from];
  const toColumn = table.columns[to];
  const keys = table.columns[table.keyScale];
  if (!fromColumn || !toColumn || !keys) return null;
  const scales = [from, to];
  const loud = scales.filter((scale) => table.parenthesesWithoutWarning?.[scale] === undefined);
  const rows = keys.flatMap((key, rowIndex) => {
    const fromValue = fromColumn[rowIndex];
    const toValue = toColumn[rowIndex];
    if (fromValue == null || toValue == null) return [];
    const parenthesised = isMarked(table.parentheses, loud, key);
    const unconfirmed = table.unconfirmed === "all" || isMarked(table.unconfirmed, scales, key);
    return [{ fromValue, toValue, rowIndex, parenthesised, unconfirmed }];
  });
  if (rows.length < 2) return null;
  rows.sort((a, b) => a.fromValue - b.fromValue);
  return {
    from: rows.map((row) => row.fromValue),
    to: rows.map((row) => row.toValue),
    rowIndex: rows.map((row) => row.rowIndex),
    parenthesised: rows.map((row) => row.parenthesised),
    unconfirmed: rows.map((row) => row.unconfirmed),
  };
}

const built = new WeakMap<HardnessTable, Map<string, ConversionPair | null>>();

/** The pair of columns, built once for each table; `null` when the table does not hold both. */
export function conversionPair(table: HardnessTable, from: Scale, to: Scale) {
  const ofTable = built.get(table) ?? new Map<string, ConversionPair | null>();
  built.set(table, ofTable);
  const key = `${from}>${to}`;
  const known = ofTable.get(key);
  if (known !== undefined) return known;
  const pair = buildPair(table, from, to);
  ofTable.set(key, pair);
  return pair;
}

export function pairRange(pair: ConversionPair): { readonly min: number; readonly max: number } {
  return { min: pair.from[0] ?? NaN, max: pair.from[pair.from.length - 1] ?? NaN };
}

/** Straight line between the two filled rows around `value`; `null` outside the filled range. */
export function readPair(pair: ConversionPair, value: number): PairReading | null {
  const lower = lastAtOrBelow(pair.from, value);
  const fromLow = pair.from[lower];
  const toLow = pair.to[lower];
  if (fromLow === undefined || toLow === undefined) return null;
  const marks = (row: number) => ({
    parenthesised: pair.parenthesised[row] === true,
    unconfirmed: pair.unconfirmed[row] === true,
  });
  if (fromLow === value) return { value: toLow, overEmptyCell: false, ...marks(lower) };
  const fromHigh = pair.from[lower + 1];
  const toHigh = pair.to[lower + 1];
  if (fromHigh === undefined || toHigh === undefined) return null;
  const low = marks(lower);
  const high = marks(lower + 1);
  return {
    value: toLow + ((toHigh - toLow) * (value - fromLow)) / (fromHigh - fromLow),
    overEmptyCell: Math.abs((pair.rowIndex[lower + 1] ?? 0) - (pair.rowIndex[lower] ?? 0)) > 1,
    parenthesised: low.parenthesised || high.parenthesised,
    unconfirmed: low.unconfirmed || high.unconfirmed,
  };
}
