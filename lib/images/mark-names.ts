import type { MarkTool } from "./constants";
import { featureOf } from "./feature-codes";
import type { MarkContent, Measurement } from "./mark-schemas";

export const MARK_TOOL_NAMES: Record<MarkTool, string> = {
  origin: "Origin",
  ratchet: "Ratchet marks",
  front: "Front",
  area: "Area",
  length: "Length",
  angle: "Angle",
  count: "Count",
  note: "Note",
};

type Named = Pick<MarkContent, "tool" | "name" | "featureCode" | "geometry">;

/** What a mark is called on screen and in lists: its own name, else its feature, else its kind. */
export function markTitle(mark: Named): string {
  if (mark.name !== "") return mark.name;
  if (mark.geometry.tool === "area" && mark.geometry.isOutline) return "Section outline";
  return featureOf(mark.featureCode)?.name ?? MARK_TOOL_NAMES[mark.tool];
}

/** The value people quote most: the first that has a number, else the first. */
export function headlineOf(measurements: readonly Measurement[]): Measurement | null {
  return measurements.find((m) => m.refused === null) ?? measurements[0] ?? null;
}
