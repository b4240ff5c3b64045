import "server-only";
import { and, eq, inArray } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { people, recordEdges, records, recordVersions } from "@/db/schema";
import { type CalibrationContent, calibrationContent } from "./calibration-schemas";
import { type MarkContent, markContent } from "./mark-schemas";

type Stored<T> = {
  id: string;
  label: string;
  isVoid: boolean;
  versionId: string;
  number: number;
  content: T;
  by: string;
  at: Date;
  /** Versions it was measured against, sorted. */
  inputs: string[];
};
export type StoredMark = Stored<MarkContent>;
export type StoredScale = Stored<CalibrationContent>;
export type PictureMarks = { scale: StoredScale | null; marks: StoredMark[] };

/** Latest version of every mark of a picture, void ones included, and of its scale. */
export async function readPictureMarks(reader: Reader, imageId: string): Promise<PictureMarks> {
  const rows = await reader
    .select({
      id: records.id,
      kind: records.kind,
      label: records.label,
      state: records.state,
      versionId: recordVersions.id,
      number: recordVersions.number,
      content: recordVersions.content,
      by: people.name,
      at: recordVersions.madeAt,
    })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .innerJoin(people, eq(people.id, recordVersions.madeById))
    .where(and(eq(records.scopeId, imageId), inArray(records.kind, ["mark", "calibration"])));
  const inputs = await inputsOf(
    reader,
    rows.map((row) => row.versionId),
  );
  const stored = rows
    .map(({ state, ...row }) => ({
      ...row,
      isVoid: state === "void",
      inputs: (inputs.get(row.versionId) ?? []).sort(),
    }))
    .sort((a, b) => numberOf(a.label) - numberOf(b.label));
  const scale = stored.find((row) => row.kind === "calibration" && !row.isVoid);
  return {
    scale: scale ? { ...scale, content: calibrationContent.parse(scale.content) } : null,
    marks: stored
      .filter((row) => row.kind === "mark")
      .map((row) => ({ ...row, content: markContent.parse(row.content) })),
  };
}

async function inputsOf(reader: Reader, versionIds: string[]): Promise<Map<string, string[]>> {
  const inputs = new Map<string, string[]>();
  if (versionIds.length === 0) return inputs;
  const edges = await reader
    .select()
    .from(recordEdges)
    .where(inArray(recordEdges.versionId, versionIds));
  for (const { versionId, inputVersionId } of edges) {
    inputs.set(versionId, [...(inputs.get(versionId) ?? []), inputVersionId]);
  }
  return inputs;
}

/** "B12" → 12, so that marks are in the order they were made within their kind. */
export function numberOf(label: string): number {
  return Number(label.replace(/^\D+/, ""));
}
