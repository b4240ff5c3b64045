import "server-only";
import sharp, { type Metadata } from "sharp";
import { formatNumber } from "@/lib/format/numbers";
import { FileRefusal } from "@/lib/uploads/file-refusal";
import { IMAGE_MAX_PIXELS } from "./constants";

/** Pages of a TIFF that are looked at when the largest is sought. */
const MOST_PAGES = 64;
const MOST_CHANNELS = 5;

export type PictureHead = {
  /** Upright, in pixels. */
  widthPx: number;
  heightPx: number;
  bitDepth: 8 | 16;
  channels: number;
  isGrey: boolean;
  colourSpace: string;
  /** Page of the file that is shown, from 0, and how many it has. */
  page: number;
  pages: number;
  /** The file asks to be turned or mirrored when shown. */
  isTurned: boolean;
  /** Turned by a quarter, so that across in the file is down when shown. */
  isOnItsSide: boolean;
};

const broken = (fileName: string) =>
  new FileRefusal(
    `${fileName} cannot be read: it is damaged or ends too early. It was not kept. Export it again at its source and send it again.`,
  );

/** Reads the head only, so a picture of any size is safe to ask. */
async function headOf(file: string, page: number, fileName: string): Promise<Metadata> {
  try {
    return await sharp(file, { page, limitInputPixels: false }).metadata();
  } catch {
    // Whatever the decoder minds in the head, the file is not a picture that can be shown.
    throw broken(fileName);
  }
}

async function largestPage(file: string, first: Metadata, fileName: string) {
  let best = { page: 0, head: first };
  const pages = first.format === "tiff" ? (first.pages ?? 1) : 1;
  for (let page = 1; page < Math.min(pages, MOST_PAGES); page += 1) {
    const head = await headOf(file, page, fileName);
    if (head.width * head.height > best.head.width * best.head.height) best = { page, head };
  }
  return { ...best, pages };
}

/**
 * Size, depth and colour of a picture, before any of its pixels are decoded.
 * @throws FileRefusal for more than 400 megapixels, or samples that are neither 8 nor 16 bit
 */
export async function readPicture(file: string, fileName: string): Promise<PictureHead> {
  const first = await headOf(file, 0, fileName);
  const { head, page, pages } = await largestPage(file, first, fileName);
  const pixels = head.width * head.height;
  if (!(pixels > 0)) throw broken(fileName);
  if (pixels > IMAGE_MAX_PIXELS) {
    throw new FileRefusal(
      `${fileName} has ${formatNumber(head.width)} × ${formatNumber(head.height)} pixels, which is ${formatNumber(pixels / 1e6, { decimals: 0 })} megapixels. At most ${IMAGE_MAX_PIXELS / 1e6} are taken. It was not kept. Crop it or send it in fields.`,
    );
  }
  const isSixteen = head.depth === "ushort";
  if (!isSixteen && head.depth !== "uchar") {
    throw new FileRefusal(
      `${fileName} holds samples of type ${head.depth}; 8 and 16 bit are taken. It was not kept. Export it with 8 or 16 bits a channel and send it again.`,
    );
  }
  if (head.channels > MOST_CHANNELS) {
    throw new FileRefusal(
      `${fileName} has ${head.channels} channels; greyscale and colour are taken. It was not kept. Export one channel, or colour, and send it again.`,
    );
  }
  return {
    widthPx: head.autoOrient.width,
    heightPx: head.autoOrient.height,
    bitDepth: isSixteen ? 16 : 8,
    channels: head.channels,
    isGrey: head.channels < 3,
    colourSpace: head.space ?? "unknown",
    page,
    pages,
    isTurned: (head.orientation ?? 1) > 1,
    isOnItsSide: (head.orientation ?? 1) >= 5,
  };
}
