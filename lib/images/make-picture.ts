import "server-only";
import path from "node:path";
import { FileRefusal } from "@/lib/uploads/file-refusal";
import type { ImageMediaType } from "./constants";
import { type FileDetails, readFileDetails } from "./file-details";
import type { StatedResolution } from "./file-resolution";
import type { GreyWindow } from "./grey-window";
import { scaleFactorsOf } from "./iiif";
import { type PictureHead, readPicture } from "./read-picture";
import { storePyramid } from "./store-pyramid";
import { makeThumbnail } from "./thumbnail";
import { decodeWhole, writePyramid } from "./tile-pyramid";

export type MadePicture = {
  head: PictureHead;
  details: FileDetails;
  /** How 16 bits were brought to 8 for the tiles; null for 8 bit. */
  window: GreyWindow | null;
  scaleFactors: number[];
};

/** The tags speak of the first page as it lies in the file, not of another page or of the turned one. */
function asShown(stated: StatedResolution | null, head: PictureHead): StatedResolution | null {
  if (stated === null || head.page > 0) return null;
  return head.isOnItsSide ? { ...stated, x: stated.y, y: stated.x } : stated;
}

/**
 * Reads a picture, and makes and stores its tiles and thumbnail under `prefix`.
 * @throws FileRefusal when the picture cannot be taken; anything else is a failure of this machine
 */
export async function makePicture(
  file: string,
  fileName: string,
  type: ImageMediaType,
  workFolder: string,
  prefix: string,
): Promise<MadePicture> {
  const head = await readPicture(file, fileName);
  const said = await readFileDetails(file, type);
  const details = { ...said, resolution: asShown(said.resolution, head) };
  const folder = path.join(workFolder, "tiles");
  const scaleFactors = scaleFactorsOf(head.widthPx, head.heightPx);
  const shape = { widthPx: head.widthPx, heightPx: head.heightPx, scaleFactors };
  let window: GreyWindow | null;
  try {
    window = await writePyramid(file, head, folder);
  } catch (cause) {
    // A full disk fails here too; only a file that cannot be decoded at all is refused.
    const isSound = await decodeWhole(file, head).then(
      () => true,
      () => false,
    );
    if (isSound) throw cause;
    throw new FileRefusal(
      `${fileName} is damaged or ends too early: it cannot be decoded to its last line. It was not kept. Copy it again from its source and send it again.`,
      { cause },
    );
  }
  await storePyramid(folder, prefix, shape, await makeThumbnail(folder, shape));
  return { head, details, window, scaleFactors };
}
