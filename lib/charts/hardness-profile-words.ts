import { decimalsOf, formatNumber } from "@/lib/format/numbers";
import type { HardnessProfileInput, ProfilePoint, ProfileSeries } from "./hardness-profile-input";
import type { ChartTable } from "./primitives";

function depthText(depthMm: number): string {
  return formatNumber(depthMm, { decimals: Math.min(3, Math.max(2, decimalsOf(depthMm))) });
}

function hardnessText(hardnessHv: number | null): string {
  return formatNumber(hardnessHv, { decimals: 0 });
}

function nameOf(series: ProfileSeries): string {
  return series.place ? `${series.label} ${series.place}` : series.label;
}

/** The result in a sentence or two: what each traverse gives, then what it is held against. */
export function profileDescription(input: HardnessProfileInput): string {
  const results = input.series.map((series) => {
    if (series.crossing) {
      return `${nameOf(series)}: ${series.crossing.kind} ${series.crossing.text} mm.`;
    }
    if (series.points.length === 0) return `${nameOf(series)}: no readings yet.`;
    return `${nameOf(series)}: no depth found.`;
  });
  if (input.limit) results.push(`${capital(input.limit.text)}.`);
  if (input.requiredDepth) results.push(`${capital(input.requiredDepth.text)}.`);
  if (results.length === 0) return "No readings yet.";
  return results.join(" ");
}

/** The readings as a table, series after series, in the order they were given. */
export function profileTable(input: HardnessProfileInput): ChartTable {
  return {
    columns: [
      { label: "Traverse", align: "left" },
      { label: "Depth, mm", align: "right" },
      { label: `${input.scaleLabel}`, align: "right" },
      { label: "± U (k = 2)", align: "right" },
      { label: "Note", align: "left" },
    ],
    rows: input.series.flatMap((series) =>
      series.points.map((point) => [
        series.label,
        depthText(point.depthMm),
        hardnessText(point.hardnessHv),
        hardnessText(point.expandedUncertaintyHv),
        noteOf(point),
      ]),
    ),
  };
}

export function readoutText(
  series: ProfileSeries,
  point: ProfilePoint,
  scaleLabel: string,
): string {
  const half = point.expandedUncertaintyHv;
  const value = half === null ? "" : ` ± ${hardnessText(half)}`;
  const note = noteOf(point);
  return (
    `${series.label}, ${depthText(point.depthMm)} mm: ` +
    `${hardnessText(point.hardnessHv)}${value} ${scaleLabel}${note ? `, ${note}` : ""}`
  );
}

function noteOf(point: ProfilePoint): string {
  return [
    point.leftOut ? "left out" : "",
    point.flagged ? "to settle" : "",
    point.convertedFrom ? `converted from ${point.convertedFrom}` : "",
  ]
    .filter(Boolean)
    .join(", ");
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
