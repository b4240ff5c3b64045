import "server-only";
import { and, eq } from "drizzle-orm";
import { database, type Reader } from "@/db/client";
import { uploads } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { checkItem } from "@/lib/images/check-item";
import { newId } from "@/lib/new-id";
import { objectStore } from "@/lib/storage/s3";
import type { z } from "zod";
import { PART_SIZE_BYTES, PART_THRESHOLD_BYTES } from "./constants";
import { promisedType, refusalBeforeSending } from "./file-rules";
import { partsOf, UPLOAD_ACTION, type UploadRow } from "./find-upload";
import { ticketFor } from "./part-addresses";
import { StartUploadInput, type UploadTicket } from "./schemas";

type Input = z.output<typeof StartUploadInput>;

/** The same file from the same person to the same case, still on its way. */
async function sameFile(reader: Reader, actor: Actor, input: Input): Promise<UploadRow | null> {
  const [row] = await reader
    .select()
    .from(uploads)
    .where(
      and(
        eq(uploads.caseId, input.caseId),
        eq(uploads.state, "sending"),
        eq(uploads.byId, actor.id),
        eq(uploads.purpose, input.purpose),
        eq(uploads.fileName, input.fileName),
        eq(uploads.sizeBytes, input.sizeBytes),
        eq(uploads.lastModified, input.lastModified),
        eq(uploads.firstPartSha256, input.firstPartSha256),
      ),
    )
    .limit(1);
  return row ?? null;
}

function newRow(actor: Actor, input: Input, s3UploadId: string | null, id: string, key: string) {
  const now = new Date();
  return {
    id,
    caseId: input.caseId,
    purpose: input.purpose,
    state: "sending",
    fileName: input.fileName,
    claimedMediaType: promisedType(input.fileName) ?? "application/octet-stream",
    sizeBytes: input.sizeBytes,
    lastModified: input.lastModified,
    firstPartSha256: input.firstPartSha256,
    claimedSha256: null,
    key,
    s3UploadId,
    partSizeBytes: s3UploadId === null ? null : PART_SIZE_BYTES,
    details: input.details,
    objectId: null,
    imageId: null,
    refusal: null,
    byId: actor.id,
    madeAt: now,
    changedAt: now,
    finishedAt: null,
  } as const satisfies UploadRow;
}

/**
 * Starts to take a file in, or goes on with the same one where it stopped.
 * @throws AppError INVALID, TOO_LARGE for what can be told before a byte is sent
 */
export async function startUpload(actor: Actor, raw: unknown): Promise<UploadTicket> {
  const input = parseInput(StartUploadInput, raw);
  await getCase(actor, UPLOAD_ACTION[input.purpose], input.caseId);
  const refusal = refusalBeforeSending(input.purpose, {
    name: input.fileName,
    size: input.sizeBytes,
  });
  if (refusal) throw new AppError(refusal.code, refusal.says);
  const known = await sameFile(database(), actor, input);
  if (known) return ticketFor(known, await partsOf(database(), known.id));

  const id = newId("upl");
  const key = `arriving/${id}`;
  const row = newRow(actor, input, null, id, key);
  const s3UploadId =
    input.sizeBytes > PART_THRESHOLD_BYTES
      ? await objectStore().startParts(key, row.claimedMediaType)
      : null;
  const upload = await writeCase(actor, UPLOAD_ACTION[input.purpose], input.caseId, async (tx) => {
    // Two windows may start the same file at once; the second goes on with the first's.
    const first = await sameFile(tx, actor, input);
    if (first) return first;
    await checkItem(tx, input.caseId, input.details.itemId, "details.itemId");
    const made = newRow(actor, input, s3UploadId, id, key);
    await tx.insert(uploads).values(made);
    await recordEvent(tx, {
      caseId: input.caseId,
      actor,
      action: UPLOAD_ACTION[input.purpose],
      subject: { kind: "upload", id, label: input.fileName },
      before: null,
      after: { state: "sending", sizeBytes: input.sizeBytes, details: input.details },
    });
    return made;
  });
  if (upload.id !== id && s3UploadId !== null) await objectStore().abortParts(key, s3UploadId);
  return ticketFor(upload, await partsOf(database(), upload.id));
}
