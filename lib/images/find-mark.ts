import "server-only";
import { and, eq } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { records } from "@/db/schema";
import { notFound } from "@/lib/errors";
import { type PictureMarks, readPictureMarks, type StoredMark } from "./picture-marks";

/** Case and picture of a mark. @throws AppError NOT_FOUND */
export async function placeOfMark(
  reader: Reader,
  markId: string,
): Promise<{ caseId: string; imageId: string }> {
  const [row] = await reader
    .select({ caseId: records.caseId, imageId: records.scopeId })
    .from(records)
    .where(and(eq(records.id, markId), eq(records.kind, "mark")));
  if (!row) throw notFound();
  return row;
}

/** A mark among those of its picture. @throws AppError NOT_FOUND */
export async function findMark(
  reader: Reader,
  imageId: string,
  markId: string,
): Promise<{ state: PictureMarks; mark: StoredMark }> {
  const state = await readPictureMarks(reader, imageId);
  const mark = state.marks.find(({ id }) => id === markId);
  if (!mark) throw notFound();
  return { state, mark };
}
