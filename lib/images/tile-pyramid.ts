import "server-only";
import sharp, { type Sharp } from "sharp";
import { IMAGE_MAX_PIXELS, TILE_SIZE_PX } from "./constants";
import { type GreyWindow, spread, windowOf } from "./grey-window";
import type { PictureHead } from "./read-picture";

const JPEG_QUALITY = 85;
/** Samples for the window are taken from a picture of this size, without averaging. */
const SAMPLED_PX = 1500;

/** Opens the shown page upright. A turned one is read at random, through the disk when it is large. */
function openPage(file: string, head: PictureHead): Sharp {
  return sharp(file, {
    page: head.page,
    limitInputPixels: IMAGE_MAX_PIXELS,
    failOn: "error",
    sequentialRead: !head.isTurned,
  }).autoOrient();
}

const sixteen = (head: PictureHead) => (head.isGrey ? "grey16" : "rgb16");

async function findWindow(file: string, head: PictureHead): Promise<GreyWindow> {
  const samples = await openPage(file, head)
    .removeAlpha()
    .pipelineColourspace(sixteen(head))
    .resize({
      width: SAMPLED_PX,
      height: SAMPLED_PX,
      fit: "inside",
      kernel: "nearest",
      withoutEnlargement: true,
    })
    .toColourspace(sixteen(head))
    .raw({ depth: "ushort" })
    .toBuffer();
  return windowOf(new Uint16Array(samples.buffer, samples.byteOffset, samples.byteLength / 2));
}

/** The picture as it is shown: upright, 8 bit, no alpha. The original keeps its values. */
function shown(file: string, head: PictureHead, window: GreyWindow | null): Sharp {
  const page = openPage(file, head);
  if (!window)
    return page.flatten({ background: "#ffffff" }).toColourspace(head.isGrey ? "b-w" : "srgb");
  const { slope, offset } = spread(window);
  return page
    .removeAlpha()
    .pipelineColourspace(sixteen(head))
    .linear(slope, offset)
    .toColourspace(head.isGrey ? "b-w" : "srgb");
}

/**
 * Writes the IIIF Image API 3 level 0 tiles of a picture (JPEG, 512 px) into `folder`, which it makes.
 * @returns the window that 16 bit samples were brought to 8 through; null for 8 bit
 */
export async function writePyramid(
  file: string,
  head: PictureHead,
  folder: string,
): Promise<GreyWindow | null> {
  const window = head.bitDepth === 16 ? await findWindow(file, head) : null;
  await shown(file, head, window)
    .jpeg({ quality: JPEG_QUALITY, chromaSubsampling: "4:4:4" })
    .tile({ size: TILE_SIZE_PX, layout: "iiif3" })
    .toFile(folder);
  return window;
}

/** Decodes a picture to its end and throws everything away; rejects when that cannot be done. */
export async function decodeWhole(file: string, head: PictureHead): Promise<void> {
  await openPage(file, head).resize({ width: 1, height: 1, fit: "fill" }).raw().toBuffer();
}
