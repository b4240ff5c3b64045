import type { RowResult } from "./check-row";
import { checkConversionRow, CONVERSION_COLUMNS } from "./conversion-rows";
import { CsvError, parseCsv } from "./csv";
import { checkQuantityRow, QUANTITY_COLUMNS } from "./quantity-rows";

/** Checks every row of a file of either form; the header tells which. */
export function checkFile(text: string): readonly RowResult[] {
  const { header, rows } = parseCsv(text);
  const has = (names: readonly string[]) => names.every((name) => header.includes(name));
  if (has(CONVERSION_COLUMNS)) return rows.map(checkConversionRow);
  if (has(QUANTITY_COLUMNS)) return rows.map(checkQuantityRow);
  throw new CsvError(
    `The header is of neither known form. Expected the columns ${CONVERSION_COLUMNS.join(", ")}, or ${QUANTITY_COLUMNS.join(", ")}.`,
  );
}
