import "server-only";
import { eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { people, organisations, requestFiles } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import { requireAllowed } from "@/lib/auth/require";
import { AppError } from "@/lib/errors";
import { findCase } from "@/lib/cases/subject";
import { touchCase } from "@/lib/cases/write-case";
import { keepOriginal, keepPicture, markTaken } from "@/lib/images/keep-picture";
import type { MadePicture } from "@/lib/images/make-picture";
import { newId } from "@/lib/new-id";
import { FileRefusal } from "./file-refusal";
import type { FileMediaType } from "./file-rules";
import { findUpload, UPLOAD_ACTION, type UploadRow } from "./find-upload";
import { uploadDetails } from "./schemas";

export type CheckedFile = {
  sha256: string;
  mediaType: FileMediaType;
  /** Null for a paper of a field return. */
  picture: MadePicture | null;
};

/** The case may have been locked, or the person's part in it ended, while the file was checked. */
async function stillAllowed(tx: Transaction, upload: UploadRow): Promise<void> {
  const loaded = await findCase(tx, upload.caseId, "lock");
  const [actor] = await tx
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      role: people.role,
      organisationId: people.organisationId,
      organisationName: organisations.name,
      organisationKind: organisations.kind,
    })
    .from(people)
    .innerJoin(organisations, eq(organisations.id, people.organisationId))
    .where(eq(people.id, upload.byId));
  if (!loaded || !actor) throw new Error(`upload ${upload.id} has no case or nobody sent it`);
  try {
    requireAllowed(actor, UPLOAD_ACTION[upload.purpose], loaded.subject);
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    throw new FileRefusal(
      `${upload.fileName} came too late to be added. ${error.message} The file was not kept.`,
      { cause: error },
    );
  }
}

async function keepRequestFile(
  tx: Transaction,
  upload: UploadRow,
  objectId: string,
): Promise<{ id: string; kind: string; label: string }> {
  const id = newId("rqf");
  const caption = uploadDetails.parse(upload.details ?? {}).caption ?? "";
  await tx
    .insert(requestFiles)
    .values({ id, caseId: upload.caseId, objectId, caption, byId: upload.byId });
  return { id, kind: "request_file", label: upload.fileName };
}

/**
 * Makes a picture or a paper of a checked file, once: a second run finds it done.
 * @throws FileRefusal when the case takes no more files
 */
export async function takeIn(seen: UploadRow, checked: CheckedFile): Promise<void> {
  await transaction(async (tx) => {
    await stillAllowed(tx, seen);
    const upload = await findUpload(tx, seen.id, "lock");
    if (upload?.state !== "sent") return;
    const objectId = await keepOriginal(tx, upload, checked);
    const picture = checked.picture
      ? await keepPicture(tx, upload, objectId, checked.picture)
      : null;
    const subject = picture
      ? { id: picture.imageId, kind: "image", label: picture.label }
      : await keepRequestFile(tx, upload, objectId);
    await markTaken(tx, upload.id, { objectId, imageId: picture?.imageId ?? null });
    await recordEvent(tx, {
      caseId: upload.caseId,
      actor: null,
      action: "system.takeInImage",
      subject,
      before: null,
      after: {
        fileName: upload.fileName,
        sha256: checked.sha256,
        sizeBytes: upload.sizeBytes,
        mediaType: checked.mediaType,
        sentBy: upload.byId,
      },
    });
    await touchCase(tx, upload.caseId);
  });
}
