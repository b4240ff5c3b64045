import type { Actor } from "@/lib/auth/actor";
import { calibrateImage } from "@/lib/images/calibrate-image";
import { addImageBytes } from "@/lib/uploads/add-bytes";
import { setRealTime } from "./clock";
import { demoPictures } from "./pictures";
import type { PictureTruth } from "./pictures/demo-picture";

export type AddedPicture = { imageId: string; label: string; truth: PictureTruth };

/** Renders one picture of the demonstration and takes it in as a person would; signed requests need real time. */
export async function addPicture(
  actor: Actor,
  caseId: string,
  fileName: string,
  details: { itemId: string | null; magnification?: number; isShareable?: boolean },
): Promise<AddedPicture> {
  const picture = demoPictures.find((known) => known.fileName === fileName);
  if (!picture) throw new Error(`there is no picture ${fileName}`);
  setRealTime();
  const { bytes, truth } = await picture.render();
  const added = await addImageBytes(actor, {
    caseId,
    fileName,
    mediaType: picture.mediaType,
    bytes,
    details: {
      caption: picture.caption,
      technique: picture.technique,
      ...(details.itemId && { itemId: details.itemId }),
      ...(details.magnification && { magnification: details.magnification }),
      ...(details.isShareable && { isShareable: true }),
    },
  });
  return { ...added, truth };
}

/** Sets the scale from the bar drawn in the picture. */
export async function scaleFromBar(
  actor: Actor,
  added: AddedPicture,
  standard: string,
): Promise<void> {
  const bar = added.truth.scaleBar;
  if (!bar) throw new Error(`${added.label} has no scale bar`);
  await calibrateImage(actor, {
    imageId: added.imageId,
    seenVersion: null,
    source: "two_points",
    standard,
    points: [
      [bar.from.x, bar.from.y],
      [bar.to.x, bar.to.y],
    ],
    knownDistanceMm: bar.lengthMm,
    knownDistanceUncertaintyMm: 0.02,
  });
}

/** Sets the scale from the file's own resolution. */
export async function scaleFromFile(actor: Actor, added: AddedPicture): Promise<void> {
  await calibrateImage(actor, {
    imageId: added.imageId,
    seenVersion: null,
    source: "file_resolution",
    relativeUncertaintyPercent: 2,
  });
}
