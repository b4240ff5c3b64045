import { lastAtOrBelow } from "../numerics/bisect";
import type { HardnessTable, MarkedRows } from "./hardness-table";
import type { Scale } from "./scales";

/** What a value takes over from the one row it meets, or the two it lies between. */
export interface PairMarks {
  /** The two rows do not stand next to one another in the table: a cell between them is empty. */
  readonly overEmptyCell: boolean;
  readonly parenthesised: boolean;
  readonly unconfirmed: boolean;
}

/** Two columns of one table made ready for reading: rows where both are filled, ascending. */
export interface ConversionPair {
  readonly from: readonly number[];
  readonly to: readonly number[];
  readonly onRow: readonly PairMarks[];
  /** Between a row and the next. */
  readonly afterRow: readonly PairMarks[];
}

export interface PairReading {
  readonly value: number;
  readonly marks: PairMarks;
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
    onRow: rows.map(({ parenthesised, unconfirmed }) => ({
      overEmptyCell: false,
      parenthesised,
      unconfirmed,
    })),
    afterRow: rows.slice(1).map((high, index) => {
      const low = rows[index] ?? high;
      return {
        overEmptyCell: Math.abs(high.rowIndex - low.rowIndex) > 1,
        parenthesised: low.parenthesised || high.parenthesised,
        unconfirmed: low.unconfirmed || high.unconfirmed,
      };
    }),
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
  const onRow = pair.onRow[lower];
  if (fromLow === undefined || toLow === undefined || !onRow) return null;
  if (fromLow === value) return { value: toLow, marks: onRow };
  const fromHigh = pair.from[lower + 1];
  const toHigh = pair.to[lower + 1];
  const between = pair.afterRow[lower];
  if (fromHigh === undefined || toHigh === undefined || !between) return null;
  const part = (value - fromLow) / (fromHigh - fromLow);
  return { value: toLow + (toHigh - toLow) * part, marks: between };
}
