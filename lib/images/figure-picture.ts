import "server-only";
import { randomBytes } from "node:crypto";
import { createWriteStream } from "node:fs";
import { rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { pipeline } from "node:stream/promises";
import sharp, { type Metadata, type Sharp } from "sharp";
import { objectStore } from "@/lib/storage/s3";
import { IMAGE_MAX_PIXELS } from "./constants";
import { windowOf } from "./grey-window";

const OPTIONS = { limitInputPixels: IMAGE_MAX_PIXELS, failOn: "truncated" } as const;

export type SmallPicture = { raw: Buffer; widthPx: number; heightPx: number; channels: 1 | 3 };

/** A picture from the store, upright, 8 bit, at most `maxPx` on its longer side. */
export async function smallPicture(key: string, maxPx: number): Promise<SmallPicture> {
  const file = path.join(tmpdir(), `riverline-figure-${randomBytes(8).toString("hex")}`);
  try {
    const { body } = await objectStore().get(key);
    await pipeline(body, createWriteStream(file));
    const metadata = await sharp(file, OPTIONS).metadata();
    const fitted = sharp(file, { ...OPTIONS, sequentialRead: true })
      .autoOrient()
      .resize({ width: maxPx, height: maxPx, fit: "inside", withoutEnlargement: true });
    return metadata.depth === "ushort"
      ? await fromSixteenBits(fitted, metadata)
      : await plain(fitted);
  } finally {
    await rm(file, { force: true });
  }
}

async function plain(picture: Sharp): Promise<SmallPicture> {
  const { data, info } = await picture
    .flatten({ background: "#ffffff" })
    .toColourspace("srgb")
    .raw()
    .toBuffer({ resolveWithObject: true });
  return {
    raw: data,
    widthPx: info.width,
    heightPx: info.height,
    channels: info.channels === 1 ? 1 : 3,
  };
}

/** Spreads what the picture holds over 8 bits; the original keeps its values for measuring. */
async function fromSixteenBits(picture: Sharp, metadata: Metadata): Promise<SmallPicture> {
  const isGrey = metadata.channels < 3;
  const { data, info } = await picture
    .removeAlpha()
    .pipelineColourspace(isGrey ? "grey16" : "rgb16")
    .toColourspace(isGrey ? "grey16" : "rgb16")
    .raw({ depth: "ushort" })
    .toBuffer({ resolveWithObject: true });
  const values = new Uint16Array(data.buffer, data.byteOffset, data.byteLength / 2);
  const { black, white } = windowOf(values);
  const raw = Buffer.alloc(values.length);
  for (const [i, value] of values.entries()) {
    raw[i] = Math.round(
      (255 * Math.min(Math.max(value - black, 0), white - black)) / (white - black),
    );
  }
  return { raw, widthPx: info.width, heightPx: info.height, channels: isGrey ? 1 : 3 };
}
