import "server-only";
import { readdir, readFile } from "node:fs/promises";
import path from "node:path";
import { objectStore } from "@/lib/storage/s3";
import { type PyramidShape, tilePath } from "./iiif";
import { THUMBNAIL_NAME } from "./thumbnail";

const AT_ONCE = 8;

/** Where the tiles and the thumbnail of an upload go; nothing there is ever changed. */
export const tilePrefix = (uploadId: string) => `tiles/${uploadId}`;

/**
 * Sends the tiles of a pyramid to the store, several at a time.
 * @returns how many tiles
 * @throws when the folder holds a tile that the portal would not ask for
 */
export async function storePyramid(
  folder: string,
  prefix: string,
  shape: PyramidShape,
  thumbnail: Buffer,
): Promise<number> {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true });
  const tiles = entries
    .filter((entry) => entry.isFile() && entry.name.endsWith(".jpg"))
    .map((entry) => path.relative(folder, path.join(entry.parentPath, entry.name)));
  const stray = tiles.find((tile) => tilePath(tile, shape) !== tile);
  if (stray) throw new Error(`tile ${stray} does not fit the pyramid`);
  const queue = tiles.values();
  const lane = async () => {
    for (const tile of queue) {
      const bytes = await readFile(path.join(folder, tile));
      await objectStore().put(`${prefix}/${tile}`, bytes, "image/jpeg");
    }
  };
  await Promise.all(Array.from({ length: AT_ONCE }, lane));
  await objectStore().put(`${prefix}/${THUMBNAIL_NAME}`, thumbnail, "image/jpeg");
  return tiles.length;
}
