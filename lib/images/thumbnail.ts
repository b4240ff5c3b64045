import "server-only";
import path from "node:path";
import sharp from "sharp";
import { type PyramidShape, wholePath } from "./iiif";

/** Longer side of a thumbnail. */
const THUMBNAIL_PX = 320;
const JPEG_QUALITY = 82;
export const THUMBNAIL_NAME = "thumbnail.jpg";

/** A small picture, made of the smallest tile of a pyramid in `folder`. */
export async function makeThumbnail(folder: string, shape: PyramidShape): Promise<Buffer> {
  return sharp(path.join(folder, wholePath(shape)))
    .resize({
      width: THUMBNAIL_PX,
      height: THUMBNAIL_PX,
      fit: "inside",
      withoutEnlargement: true,
    })
    .jpeg({ quality: JPEG_QUALITY })
    .toBuffer();
}
