import "server-only";
import sharp from "sharp";
import { AppError } from "@/lib/errors";
import type { FigureBlock } from "./model";

/** Images ready to embed, by the figure they belong to. */
export type PreparedImages = ReadonlyMap<FigureBlock, Uint8Array>;

/** 300 dots to the inch over the full measure; more is not seen in print. */
const MOST_WIDTH_PX = 2100;
const MOST_HEIGHT_PX = 2700;

/**
 * Brings each figure to what a PDF can hold unchanged in every reader: 8 bit, no alpha, no
 * interlace, upright, not finer than print. A JPEG that is so already is kept byte for byte.
 */
export async function prepareImages(figures: readonly FigureBlock[]): Promise<PreparedImages> {
  const prepared = new Map<FigureBlock, Uint8Array>();
  for (const figure of figures) prepared.set(figure, await prepareImage(figure));
  return prepared;
}

async function prepareImage(figure: FigureBlock): Promise<Uint8Array> {
  try {
    const image = sharp(figure.image, { limitInputPixels: 400e6, failOn: "truncated" });
    const { format, width, height, space, orientation } = await image.metadata();
    const fine = width > MOST_WIDTH_PX || height > MOST_HEIGHT_PX;
    const plain = (orientation ?? 1) === 1 && (space === "srgb" || space === "b-w");
    if (format === "jpeg" && plain && !fine) return figure.image;
    const upright = image
      .rotate()
      .resize({
        width: MOST_WIDTH_PX,
        height: MOST_HEIGHT_PX,
        fit: "inside",
        withoutEnlargement: true,
      })
      .flatten({ background: "#ffffff" })
      .toColourspace(space === "b-w" || space === "grey16" ? "b-w" : "srgb");
    if (format === "jpeg") return await upright.jpeg({ quality: 90 }).toBuffer();
    return await upright.png({ progressive: false, palette: false }).toBuffer();
  } catch (cause) {
    throw new AppError(
      "INVALID",
      `The picture of ${nameOf(figure)} cannot be read. The text is kept. Put the picture in again, then make the report again.`,
      { cause },
    );
  }
}

function nameOf(figure: FigureBlock): string {
  return figure.number === undefined ? `the figure "${figure.alt}"` : `Figure ${figure.number}`;
}
