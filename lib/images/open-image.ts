import "server-only";
import { eq } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { images, records } from "@/db/schema";
import { AppError, notFound } from "@/lib/errors";

export type OpenImage = {
  id: string;
  caseId: string;
  label: string;
  widthPx: number;
  heightPx: number;
  fileUmPerPxX: number | null;
  fileUmPerPxY: number | null;
};

/** Case of a picture. @throws AppError NOT_FOUND */
export async function caseOfImage(reader: Reader, imageId: string): Promise<string> {
  const [row] = await reader
    .select({ caseId: images.caseId })
    .from(images)
    .where(eq(images.recordId, imageId));
  if (!row) throw notFound();
  return row.caseId;
}

/** A picture that can be marked. @throws AppError NOT_FOUND, or LOCKED when it is not ready or withdrawn */
export async function openImage(reader: Reader, imageId: string): Promise<OpenImage> {
  const [row] = await reader
    .select({ image: images, label: records.label, recordState: records.state })
    .from(images)
    .innerJoin(records, eq(records.id, images.recordId))
    .where(eq(images.recordId, imageId));
  if (!row) throw notFound();
  const { image, label } = row;
  if (row.recordState === "void") {
    throw new AppError(
      "LOCKED",
      `${label} was withdrawn, so it takes no marks. Put it back first.`,
    );
  }
  if (image.state !== "ready" || image.widthPx === null || image.heightPx === null) {
    throw new AppError(
      "LOCKED",
      image.state === "refused"
        ? `${label} was refused, so it takes no marks.`
        : `${label} is still being made ready. Nothing was saved. Try again in a moment.`,
    );
  }
  return {
    id: imageId,
    caseId: image.caseId,
    label,
    widthPx: image.widthPx,
    heightPx: image.heightPx,
    fileUmPerPxX: image.fileUmPerPxX,
    fileUmPerPxY: image.fileUmPerPxY,
  };
}
