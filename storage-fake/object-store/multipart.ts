import { randomBytes, randomUUID } from "node:crypto";
import { mkdir, readdir, rename, rm } from "node:fs/promises";
import path from "node:path";
import type { Checksum, ChecksumAlgorithm } from "./checksum";
import { flushFolder, isMissing, readJson, removeIfThere, writeJson } from "./disk";
import { noSuchUpload } from "./errors";
import type { ReceivedBody } from "./receive-body";
import type { Bucket, Store } from "./store";

/** One multipart upload, kept in a folder of its own until it is completed or aborted. */
export interface Upload {
  id: string;
  key: string;
  /** ISO 8601, UTC. */
  initiatedAt: string;
  headers: Record<string, string>;
  checksumAlgorithm?: ChecksumAlgorithm;
}

export interface Part {
  /** From 1 to 10 000. */
  partNumber: number;
  dataName: string;
  size: number;
  /** MD5 in hex, without quotes. */
  etag: string;
  lastModified: string;
  checksum?: Checksum;
}

function uploadFolder(bucket: Bucket, uploadId: string): string {
  return path.join(bucket.uploadsFolder, uploadId);
}

function sidecarName(partNumber: number): string {
  return `part-${String(partNumber).padStart(5, "0")}.json`;
}

export function partPath(bucket: Bucket, uploadId: string, part: Part): string {
  return path.join(uploadFolder(bucket, uploadId), part.dataName);
}

export async function createUpload(
  store: Store,
  bucket: Bucket,
  draft: Omit<Upload, "id" | "initiatedAt">,
): Promise<Upload> {
  const upload = {
    ...draft,
    id: randomBytes(16).toString("hex"),
    initiatedAt: new Date().toISOString(),
  };
  const folder = uploadFolder(bucket, upload.id);
  await mkdir(folder);
  await writeJson(path.join(folder, "upload.json"), store.temporaryPath(), upload);
  await flushFolder(bucket.uploadsFolder);
  return upload;
}

/** @throws StoreError 404 when it does not exist or belongs to another key. */
export async function getUpload(bucket: Bucket, uploadId: string, key: string): Promise<Upload> {
  if (!/^[0-9a-f]{32}$/.test(uploadId)) throw noSuchUpload();
  const upload = await readJson<Upload>(path.join(uploadFolder(bucket, uploadId), "upload.json"));
  if (!upload || upload.key !== key) throw noSuchUpload();
  return upload;
}

/** Uploads that were neither completed nor aborted, in no order. */
export async function openUploads(bucket: Bucket): Promise<Upload[]> {
  const names = await readdir(bucket.uploadsFolder);
  const uploads = await Promise.all(
    names.map((name) => readJson<Upload>(path.join(uploadFolder(bucket, name), "upload.json"))),
  );
  return uploads.filter((upload) => upload !== undefined);
}

/** Keeps a received part; a part sent again under its number replaces the earlier one. */
export async function keepPart(
  store: Store,
  bucket: Bucket,
  uploadId: string,
  partNumber: number,
  body: ReceivedBody,
): Promise<Part> {
  const folder = uploadFolder(bucket, uploadId);
  const sidecar = path.join(folder, sidecarName(partNumber));
  return store.locks.run(`${uploadId}#${partNumber}`, async () => {
    const earlier = await readJson<Part>(sidecar);
    const part: Part = {
      partNumber,
      dataName: `part-${randomUUID()}.data`,
      size: body.size,
      etag: body.md5Hex,
      lastModified: new Date().toISOString(),
      ...(body.checksum ? { checksum: body.checksum } : {}),
    };
    try {
      await rename(body.path, path.join(folder, part.dataName));
      await writeJson(sidecar, store.temporaryPath(), part);
    } catch (error) {
      await removeIfThere(body.path);
      // The folder goes when the upload is completed or aborted while a part is still arriving.
      if (isMissing(error)) throw noSuchUpload();
      throw error;
    }
    if (earlier) await removeIfThere(path.join(folder, earlier.dataName));
    return part;
  });
}

/** All parts in the order of their numbers. */
export async function listParts(bucket: Bucket, uploadId: string): Promise<Part[]> {
  const folder = uploadFolder(bucket, uploadId);
  const names = (await readdir(folder)).filter((name) => /^part-\d{5}\.json$/.test(name)).sort();
  const parts = await Promise.all(names.map((name) => readJson<Part>(path.join(folder, name))));
  return parts.filter((part) => part !== undefined);
}

export async function removeUpload(bucket: Bucket, uploadId: string): Promise<void> {
  const folder = uploadFolder(bucket, uploadId);
  // First the file that makes it an upload, so that a half-removed folder is none.
  await removeIfThere(path.join(folder, "upload.json"));
  await rm(folder, { recursive: true, force: true });
}
