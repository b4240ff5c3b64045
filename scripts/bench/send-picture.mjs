import { createHash } from "node:crypto";
import { open, stat } from "node:fs/promises";
import path from "node:path";
import sharp from "sharp";
import { setTimeout as sleep } from "node:timers/promises";
import { askJson, askWell } from "./http-client.mjs";

const SIDE_PX = 10_000;

/** Writes a grainy colour TIFF of 100 megapixels, not compressed. */
export async function makePicture(folder) {
  const file = path.join(folder, "hundred-megapixels.tif");
  const noise = { type: "gaussian", mean: 128, sigma: 12 };
  await sharp({
    create: { width: SIDE_PX, height: SIDE_PX, channels: 3, background: "#808080", noise },
  })
    .tiff({ compression: "none" })
    .toFile(file);
  return file;
}

async function digests(handle, size, partSizeBytes) {
  const whole = createHash("sha256");
  let first = "";
  for (let at = 0; at < size; at += partSizeBytes) {
    const part = await readAt(handle, at, Math.min(partSizeBytes, size - at));
    whole.update(part);
    first ||= createHash("sha256").update(part).digest("hex");
  }
  return { sha256: whole.digest("hex"), firstPartSha256: first };
}

async function readAt(handle, position, length) {
  const { buffer, bytesRead } = await handle.read(Buffer.alloc(length), 0, length, position);
  if (bytesRead !== length) throw new Error("the picture ends too early");
  return buffer;
}

const FIRST_PART_BYTES = 8 * 1024 * 1024;

/**
 * Sends a picture to a case as a browser does: straight to the store, in parts.
 * @returns the upload's id and when the portal had put the job in its queue
 */
export async function sendPicture(portal, file) {
  const { size } = await stat(file);
  const handle = await open(file);
  const call = (address, json) =>
    askJson(`${portal.base}${address}`, {
      method: "POST",
      headers: { cookie: portal.cookie },
      json,
    });
  try {
    const { sha256, firstPartSha256 } = await digests(handle, size, FIRST_PART_BYTES);
    const { uploadId, way } = await call("/api/uploads", {
      caseId: portal.caseId,
      purpose: "image",
      fileName: path.basename(file),
      sizeBytes: size,
      mediaType: "image/tiff",
      lastModified: 1_700_000_000_000,
      firstPartSha256,
      details: { technique: "stereo" },
    });
    const count = Math.ceil(size / way.partSizeBytes);
    for (let partNumber = 1; partNumber <= count; partNumber += 1) {
      const at = (partNumber - 1) * way.partSizeBytes;
      const body = await readAt(handle, at, Math.min(way.partSizeBytes, size - at));
      const { parts } = await call(`/api/uploads/${uploadId}/parts`, { want: [partNumber] });
      const { headers } = await askWell(parts[0].url, { method: "PUT", body });
      const done = [{ partNumber, etag: headers.etag, sizeBytes: body.byteLength }];
      await call(`/api/uploads/${uploadId}/parts`, { done });
    }
    await call(`/api/uploads/${uploadId}/finish`, { sha256 });
    return { uploadId, queuedAt: performance.now() };
  } finally {
    await handle.close();
  }
}

const LOOK_EVERY_MS = 50;

/** Waits until the worker has taken the picture in. @returns the picture's id */
export async function untilTaken(portal, uploadId) {
  for (;;) {
    const { state, imageId, refusal } = await askJson(`${portal.base}/api/uploads/${uploadId}`, {
      headers: { cookie: portal.cookie },
    });
    if (state === "taken") return imageId;
    if (state !== "sent") throw new Error(`the picture was not taken in: ${refusal ?? state}`);
    await sleep(LOOK_EVERY_MS);
  }
}
