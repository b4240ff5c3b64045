import { SCALES } from "@/lib/hardness/scales";
import type { ResultContent, TraverseContent } from "./schemas";

/** A cell that a spreadsheet would run as a formula is led by an apostrophe. */
function csvCell(value: string | number | null | undefined): string {
  if (value === null || value === undefined) return "";
  const text =
    typeof value === "string" && /^[=+\-@\t\r]/.test(value) ? `'${value}` : String(value);
  return /[",\n\r]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** The table as a file: what was typed, what follows from it, and the table of the conversions. */
export function traverseCsv(content: TraverseContent, result: ResultContent): string {
  const scales = [
    ...new Set(result.readings.flatMap(({ conversions }) => conversions.map(({ to }) => to))),
  ];
  const [title = ""] = result.tableTitles;
  const head = [
    "No.",
    "Depth mm",
    "d1 um",
    "d2 um",
    `${result.symbol} measured`,
    "U (k = 2)",
    ...scales.map((scale) => `${SCALES[scale].symbol} converted, ${title}`),
    "Left out because",
    "Kept because",
    "Note",
  ];
  const rows = content.readings.map((typed, index) => {
    const worked = result.readings[index];
    return [
      index + 1,
      typed.depth,
      typed.d1,
      typed.d2,
      worked?.hardness,
      worked?.expandedUncertainty,
      ...scales.map((scale) => worked?.conversions.find(({ to }) => to === scale)?.value ?? null),
      typed.leftOutReason,
      typed.keptReason,
      typed.note,
    ];
  });
  return [head, ...rows].map((cells) => cells.map(csvCell).join(",")).join("\r\n") + "\r\n";
}
