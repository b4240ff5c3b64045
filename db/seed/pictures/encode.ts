import sharp, { type Sharp } from "sharp";
import type { Picture } from "./picture";

/** How a picture is written. `pixelSizeMm` goes into the file's resolution when it is given. */
export interface Encoding {
  mediaType: "image/jpeg" | "image/png" | "image/tiff";
  pixelSizeMm?: number;
  /** JPEG quality; with TIFF it packs the picture as JPEG strips instead of without loss. */
  quality?: number;
}

function encoder(picture: Picture, encoding: Encoding): Sharp {
  const { width, height, channels } = picture;
  const deep = picture.data instanceof Uint16Array;
  let image = sharp(picture.data, { raw: { width, height, channels }, limitInputPixels: false });
  if (channels === 1) image = image.toColourspace(deep ? "grey16" : "b-w");
  // JPEG and PNG carry dots per inch; sharp takes TIFF resolution in pixels per millimetre.
  if (encoding.pixelSizeMm && encoding.mediaType !== "image/tiff") {
    image = image.withMetadata({ density: 25.4 / encoding.pixelSizeMm });
  }
  if (encoding.mediaType === "image/jpeg") {
    return image.jpeg({ quality: encoding.quality ?? 90, chromaSubsampling: "4:4:4" });
  }
  if (encoding.mediaType === "image/png") return image.png({ compressionLevel: 7 });
  const resolution = encoding.pixelSizeMm ? 1 / encoding.pixelSizeMm : undefined;
  return image.tiff({
    ...(encoding.quality
      ? { compression: "jpeg", quality: encoding.quality }
      : { compression: "deflate", predictor: "horizontal" }),
    ...(resolution ? { xres: resolution, yres: resolution, resolutionUnit: "cm" } : {}),
  });
}

/** The file's bytes. */
export async function encodePicture(picture: Picture, encoding: Encoding): Promise<Buffer> {
  return encoder(picture, encoding).toBuffer();
}
