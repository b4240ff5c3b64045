import { answerConvertRequest } from "@/lib/hardness/convert-request";
import { ALL_TABLE_IDS } from "@/lib/hardness/published-tables";
import type { RowResult } from "./check-row";
import type { CsvRow } from "./csv";

export const CONVERSION_COLUMNS = [
  "id",
  "material_group",
  "table",
  "from_scale",
  "from_value",
  "input_status",
  "to_scale",
  "verdict",
  "expected",
  "tolerance",
] as const;

/**
 * One conversion through the same request that the portal answers, with every table switched on. A
 * name that the product does not know counts as a refusal: it gives no number.
 */
export function checkConversionRow(row: CsvRow): RowResult {
  const { id = "", verdict = "", input_status: status = "" } = row;
  const unsupported = (reason: string): RowResult => ({ id, status: "unsupported", reason });
  const failed = (reason: string): RowResult => ({ id, status: "failed", reason });
  const value = Number(row.from_value);
  if (row.from_value?.trim() === "" || Number.isNaN(value))
    return unsupported(`the value "${row.from_value}" is not a number`);
  if (status !== "measured" && status !== "converted")
    return unsupported(`the input status "${status}" is not known`);
  if (verdict !== "convert" && verdict !== "refuse")
    return unsupported(`the verdict "${verdict}" is not known`);

  const table = (row.table ?? "").replace(/\.csv$/, "");
  const answer = answerConvertRequest(
    {
      materialGroup: row.material_group ?? "",
      from: row.from_scale ?? "",
      values: [{ value, status }],
      to: [row.to_scale ?? ""],
      table: table === "" ? undefined : table,
    },
    ALL_TABLE_IDS,
  );
  const conversion = answer.ok ? answer.results[0]?.conversions[0] : undefined;
  if (verdict === "refuse") {
    return conversion?.status === "ok"
      ? failed(`expected a refusal, got ${conversion.value}`)
      : { id, status: "passed" };
  }
  if (!answer.ok)
    return failed(answer.unknownNames.map(({ kind, name }) => `no ${kind} "${name}"`).join(", "));
  if (conversion?.status !== "ok")
    return failed(`expected ${row.expected}, refused: ${conversion?.reason}`);
  const isNear = Math.abs(conversion.value - Number(row.expected)) <= Number(row.tolerance);
  return isNear
    ? { id, status: "passed" }
    : failed(`expected ${row.expected} within ${row.tolerance}, got ${conversion.value}`);
}
