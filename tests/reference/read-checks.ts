import { readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { parseCsv, type CsvRow } from "@/scripts/check-values/csv";

export function dataPath(name: string): string {
  return fileURLToPath(new URL(`./data/${name}`, import.meta.url));
}

/** Rows of a check file with the words that name a test: id, what is asked, published source. */
export function readChecks(
  name: string,
): readonly { readonly title: string; readonly row: CsvRow }[] {
  return parseCsv(readFileSync(dataPath(name), "utf8")).rows.map((row) => {
    const asked = row.quantity ?? `${row.from_value} ${row.from_scale} to ${row.to_scale}`;
    return { title: `${row.id} ${asked} [${row.source}]`, row };
  });
}
