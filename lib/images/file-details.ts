import "server-only";
import { open } from "node:fs/promises";
import exifr from "exifr";
import { z } from "zod";
import type { ImageMediaType } from "./constants";
import {
  fromJfif,
  fromPng,
  fromTiffTags,
  type StatedResolution,
  umPerPxFrom,
} from "./file-resolution";

const HEAD_BYTES = 256 * 1024;

const text = z.string().trim().min(1).max(500).optional().catch(undefined);
const tags = z.object({
  XResolution: z.unknown().optional(),
  YResolution: z.unknown().optional(),
  ResolutionUnit: z.unknown().optional(),
  Make: text,
  Model: text,
  Software: text,
  DateTimeOriginal: text,
  CreateDate: text,
  ImageDescription: text,
});

export type FileDetails = {
  resolution: StatedResolution | null;
  /** YYYY-MM-DD, as the instrument's clock had it. */
  takenOn: string | null;
  instrument: string | null;
  software: string | null;
  description: string | null;
  /** Why the tags could not be read, for the metadata; null when they could. */
  unread: string | null;
};

async function readTags(
  file: string,
): Promise<{ tags: z.infer<typeof tags>; unread: string | null }> {
  const options = {
    tiff: true,
    exif: true,
    gps: false,
    interop: false,
    makerNote: false,
    xmp: false,
    icc: false,
    iptc: false,
    jfif: false,
    ihdr: false,
    translateValues: false,
    reviveValues: false,
    sanitize: true,
    mergeOutput: true,
  };
  try {
    return { tags: tags.parse((await exifr.parse(file, options)) ?? {}), unread: null };
  } catch (error) {
    // Tags are a help, not a condition: a picture whose tags are broken is still a picture.
    return { tags: tags.parse({}), unread: error instanceof Error ? error.message : String(error) };
  }
}

async function headOf(file: string): Promise<Uint8Array> {
  const handle = await open(file);
  try {
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(HEAD_BYTES), 0, HEAD_BYTES, 0);
    return buffer.subarray(0, bytesRead);
  } finally {
    await handle.close();
  }
}

/** "2026:11:20 09:10:11" of EXIF as a date; null for the zeros of a clock that was never set. */
function dateOf(stamp: string | undefined): string | null {
  const match = /^(\d{4})[:-](\d{2})[:-](\d{2})/.exec(stamp ?? "");
  const date = match ? `${match[1]}-${match[2]}-${match[3]}` : "";
  return z.iso.date().safeParse(date).success ? date : null;
}

/** What a picture file says of itself: resolution, date, instrument. */
export async function readFileDetails(file: string, type: ImageMediaType): Promise<FileDetails> {
  const [read, head] = await Promise.all([readTags(file), headOf(file)]);
  const { tags: said, unread } = read;
  const own = type === "image/png" ? fromPng(head) : type === "image/jpeg" ? fromJfif(head) : null;
  const stated = [
    fromTiffTags(said.XResolution, said.YResolution, said.ResolutionUnit),
    own,
  ].filter((one) => one !== null);
  return {
    // EXIF and the format's own header may differ; the one that can be a scale goes first.
    resolution: stated.find((one) => umPerPxFrom(one) !== null) ?? stated[0] ?? null,
    takenOn: dateOf(said.DateTimeOriginal) ?? dateOf(said.CreateDate),
    instrument: [said.Make, said.Model].filter(Boolean).join(" ") || null,
    software: said.Software ?? null,
    description: said.ImageDescription ?? null,
    unread,
  };
}
