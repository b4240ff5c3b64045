import "server-only";
import { eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { images, storedObjects, uploads } from "@/db/schema";
import { newId } from "@/lib/new-id";
import { LABEL_PREFIX } from "@/lib/records/constants";
import { createRecord, nextLabel } from "@/lib/records/write-version";
import { originalKey } from "@/lib/uploads/fetch-original";
import type { FileMediaType } from "@/lib/uploads/file-rules";
import type { UploadRow } from "@/lib/uploads/find-upload";
import { uploadDetails } from "@/lib/uploads/schemas";
import { umPerPxFrom } from "./file-resolution";
import type { ImageContent } from "./image-schemas";
import type { MadePicture } from "./make-picture";
import { tilePrefix } from "./store-pyramid";

/** Writes down the original of an upload, which stands in the store already. */
export async function keepOriginal(
  tx: Transaction,
  upload: UploadRow,
  file: { sha256: string; mediaType: FileMediaType },
): Promise<string> {
  const objectId = newId("obj");
  await tx.insert(storedObjects).values({
    id: objectId,
    caseId: upload.caseId,
    key: originalKey(upload.id),
    fileName: upload.fileName,
    mediaType: file.mediaType,
    sizeBytes: upload.sizeBytes,
    sha256: file.sha256,
    madeById: upload.byId,
  });
  return objectId;
}

/** Marks an upload as taken in. */
export async function markTaken(
  tx: Transaction,
  uploadId: string,
  made: { objectId: string; imageId: string | null },
): Promise<void> {
  await tx
    .update(uploads)
    .set({ ...made, state: "taken", changedAt: new Date() })
    .where(eq(uploads.id, uploadId));
}

function contentOf(upload: UploadRow, { details: file }: MadePicture): ImageContent {
  const said = uploadDetails.parse(upload.details ?? {});
  return {
    caption: said.caption ?? "",
    technique: said.technique ?? "other",
    itemId: said.itemId ?? null,
    face: said.face ?? "",
    magnification: said.magnification ?? null,
    takenOn: said.takenOn ?? file.takenOn,
  };
}

/** What the file says of itself, and how it is shown. */
function metadataOf({ head, details, window }: MadePicture): Record<string, unknown> {
  const { resolution, instrument, software, description, unread } = details;
  return {
    resolution,
    instrument,
    software,
    description,
    tagsNotRead: unread,
    colourSpace: head.colourSpace,
    page: head.page + 1,
    pages: head.pages,
    isTurned: head.isTurned,
    shownWindow: window,
  };
}

/** Makes the picture's record, ready to mark. The caller holds the case and records the event. */
export async function keepPicture(
  tx: Transaction,
  upload: UploadRow,
  objectId: string,
  made: MadePicture,
): Promise<{ imageId: string; label: string }> {
  const label = await nextLabel(tx, upload.caseId, LABEL_PREFIX.image);
  const { recordId } = await createRecord(
    tx,
    { id: upload.byId },
    { caseId: upload.caseId, kind: "image", label },
    { content: contentOf(upload, made) },
  );
  const size = umPerPxFrom(made.details.resolution);
  await tx.insert(images).values({
    recordId,
    caseId: upload.caseId,
    objectId,
    state: "ready",
    widthPx: made.head.widthPx,
    heightPx: made.head.heightPx,
    bitDepth: made.head.bitDepth,
    channels: made.head.channels,
    fileUmPerPxX: size?.x ?? null,
    fileUmPerPxY: size?.y ?? null,
    metadata: metadataOf(made),
    tilePrefix: tilePrefix(upload.id),
    scaleFactors: made.scaleFactors,
    isShareable: uploadDetails.parse(upload.details ?? {}).isShareable ?? false,
  });
  return { imageId: recordId, label };
}
