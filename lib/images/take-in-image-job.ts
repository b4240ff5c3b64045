import "server-only";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { z } from "zod";
import { database } from "@/db/client";
import type { JobHandler } from "@/lib/jobs/handler";
import { checkPaper } from "@/lib/uploads/check-paper";
import { clearArrival, fetchOriginal } from "@/lib/uploads/fetch-original";
import { FileRefusal } from "@/lib/uploads/file-refusal";
import { findUpload, type UploadRow } from "@/lib/uploads/find-upload";
import { refuseUpload } from "@/lib/uploads/refuse-upload";
import { type CheckedFile, takeIn } from "@/lib/uploads/take-in";
import { IMAGE_MEDIA_TYPES } from "./constants";
import { inspectFile } from "./inspect-file";
import { makePicture } from "./make-picture";
import { tilePrefix } from "./store-pyramid";

export const WORK_FOLDER_PREFIX = "riverline-take-in-";
const payloadSchema = z.object({ uploadId: z.string() });

/** Everything that can be found out about a file without writing to the database. */
async function checkFile(upload: UploadRow, folder: string): Promise<CheckedFile> {
  const file = path.join(folder, "original");
  const { sha256 } = await fetchOriginal(upload, file);
  const mediaType = await inspectFile(file, upload.fileName, upload.purpose);
  const imageType = IMAGE_MEDIA_TYPES.find((known) => known === mediaType);
  if (upload.purpose !== "image" || !imageType) {
    await checkPaper(file, upload.fileName, mediaType);
    return { sha256, mediaType, picture: null };
  }
  const prefix = tilePrefix(upload.id);
  const picture = await makePicture(file, upload.fileName, imageType, folder, prefix);
  return { sha256, mediaType, picture };
}

/**
 * Looks into a file that was sent, keeps its original unchanged and makes a picture or paper of it,
 * or refuses it in words. Nothing is written to the database before the last step, so a worker that
 * dies anywhere leaves a job that can be run again from its start.
 */
export const takeInImageJob: JobHandler = {
  async run(payload) {
    const { uploadId } = payloadSchema.parse(payload);
    const upload = await findUpload(database(), uploadId);
    if (!upload || upload.state === "sending") return;
    if (upload.state !== "sent") {
      await clearArrival(upload, upload.state === "taken");
      return;
    }
    const folder = await mkdtemp(path.join(tmpdir(), WORK_FOLDER_PREFIX));
    try {
      const checked = await checkFile(upload, folder);
      await takeIn(upload, checked);
      await clearArrival(upload, true);
    } catch (error) {
      if (!(error instanceof FileRefusal)) throw error;
      if (await refuseUpload(upload.id, error.message)) await clearArrival(upload, false);
    } finally {
      await rm(folder, { recursive: true, force: true });
    }
  },
  async givenUp(payload) {
    const { uploadId } = payloadSchema.parse(payload);
    const upload = await findUpload(database(), uploadId);
    if (!upload) return;
    const isRefused = await refuseUpload(
      uploadId,
      `Riverline failed at making ${upload.fileName} ready, several times. It was not kept. Send it again, and tell your administrator if it stays.`,
    );
    if (isRefused) await clearArrival(upload, false);
  },
};
