import "server-only";
import { readdir, rm, stat } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { and, eq, lt } from "drizzle-orm";
import { database } from "@/db/client";
import { uploads } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import { WORK_FOLDER_PREFIX } from "@/lib/images/take-in-image-job";
import type { JobHandler } from "@/lib/jobs/handler";
import { objectStore } from "@/lib/storage/s3";
import { UNFINISHED_KEPT_DAYS } from "./constants";
import { clearArrival } from "./fetch-original";
import { findUpload, type UploadRow } from "./find-upload";
import { refuseUpload } from "./refuse-upload";
import { scheduleTidy } from "./schedule-tidy";

const DAY_MS = 86_400_000;

/** Gives up a file that nobody went on sending, and frees its parts in the store. */
async function giveUp(seen: UploadRow, before: Date): Promise<void> {
  const isGivenUp = await transaction(async (tx) => {
    const upload = await findUpload(tx, seen.id, "lock");
    if (upload?.state !== "sending" || upload.changedAt >= before) return false;
    await tx
      .update(uploads)
      .set({ state: "cancelled", changedAt: new Date() })
      .where(eq(uploads.id, upload.id));
    await recordEvent(tx, {
      caseId: upload.caseId,
      actor: null,
      action: "system.takeInImage",
      subject: { kind: "upload", id: upload.id, label: upload.fileName },
      before: { state: "sending" },
      after: { state: "cancelled", reason: `not gone on with for ${UNFINISHED_KEPT_DAYS} days` },
    });
    return true;
  });
  if (!isGivenUp) return;
  if (seen.s3UploadId !== null) await objectStore().abortParts(seen.key, seen.s3UploadId);
  await objectStore().remove(seen.key);
}

/** A worker that dies at its last try cannot say so; without this its file would be checked for ever. */
async function refuseStuck(before: Date): Promise<void> {
  const stuck = await database()
    .select()
    .from(uploads)
    .where(and(eq(uploads.state, "sent"), lt(uploads.changedAt, before)));
  for (const upload of stuck) {
    const isRefused = await refuseUpload(
      upload.id,
      `Riverline could not make ${upload.fileName} ready within a day. It was not kept. Send it again, and tell your administrator if it stays.`,
    );
    if (isRefused) await clearArrival(upload, false);
  }
}

/** Folders of a worker that was killed. */
async function clearWorkFolders(before: Date): Promise<void> {
  for (const name of await readdir(tmpdir())) {
    if (!name.startsWith(WORK_FOLDER_PREFIX)) continue;
    const folder = path.join(tmpdir(), name);
    const found = await stat(folder);
    if (found.mtime < before) await rm(folder, { recursive: true, force: true });
  }
}

/** Clears what unfinished uploads and killed workers left, and asks for itself again tomorrow. */
export const tidyUploadsJob: JobHandler = {
  async run() {
    const now = Date.now();
    const before = new Date(now - UNFINISHED_KEPT_DAYS * DAY_MS);
    const old = await database()
      .select()
      .from(uploads)
      .where(and(eq(uploads.state, "sending"), lt(uploads.changedAt, before)));
    for (const upload of old) await giveUp(upload, before);
    await refuseStuck(new Date(now - DAY_MS));
    await clearWorkFolders(new Date(now - DAY_MS));
    await scheduleTidy(new Date(now + DAY_MS));
  },
};
