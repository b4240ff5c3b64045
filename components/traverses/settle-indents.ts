import { withReading } from "@/lib/traverses/edit-readings";
import type { ResultContent, TraverseContent, TypedReading } from "@/lib/traverses/schemas";
import type { Answered, Asked } from "./reason-dialog";

type Readings = readonly TypedReading[];

/** The indents of an item, shallower first. */
export function indentsOf(ids: readonly string[], result: ResultContent): Asked["indents"] {
  return result.readings
    .filter(({ id }) => ids.includes(id))
    .toSorted((a, b) => (a.depthMm ?? 0) - (b.depthMm ?? 0))
    .map(({ id, number }) => ({ id, number }));
}

const without = <K extends keyof TypedReading>(reading: TypedReading, key: K): TypedReading => {
  const next = { ...reading };
  delete next[key];
  return next;
};

export const putBack = (readings: Readings, ids: readonly string[]) =>
  readings.map((row) => (ids.includes(row.id) ? without(row, "leftOutReason") : row));

export const takeReasonBack = (readings: Readings, ids: readonly string[]) =>
  readings.map((row) => (ids.includes(row.id) ? without(row, "keptReason") : row));

/** Writes the answer of the dialog into the indents it is about. */
export function withAnswer(
  content: TraverseContent,
  asked: Asked,
  { kind, id, reason }: Answered,
): TraverseContent {
  const { readings } = content;
  if (kind === "leave-out")
    return {
      ...content,
      readings: withReading(readings, id, (row) => ({ ...row, leftOutReason: reason })),
    };
  if (kind === "keep")
    return {
      ...content,
      readings: withReading(readings, id, (row) => ({ ...row, keptReason: reason })),
    };
  const [shallower] = asked.indents;
  const isPlaced = (row: TypedReading) => (row.lateral ?? "") !== "";
  return {
    ...content,
    readings: readings.map((row) => {
      if (row.id === id) return { ...row, lateral: reason };
      // Every other indent of the traverse stands on its line, at zero, unless it has a place.
      return row.id === shallower?.id && !isPlaced(row) ? { ...row, lateral: "0" } : row;
    }),
  };
}
