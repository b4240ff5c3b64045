import type { ImageMediaType, Technique } from "@/lib/images/constants";
import type { CaseLayerTruth } from "./case-layer";
import type { FacePicture } from "./draw-face";
import { encodePicture } from "./encode";
import type { FaceTruth } from "./face-truth";
import type { Picture, ScaleBar, ScaledPicture, Size } from "./picture";
import type { WeldTruth } from "./weld-toe-crack";

/** What is known to be in a picture, in its pixels. */
export interface PictureTruth {
  scaleBar?: ScaleBar;
  face?: FaceTruth;
  caseLayer?: CaseLayerTruth;
  weld?: WeldTruth;
}

export interface RenderedPicture {
  bytes: Buffer;
  truth: PictureTruth;
}

/** One picture of the demonstration. */
export interface DemoPicture {
  fileName: string;
  mediaType: ImageMediaType;
  technique: Technique;
  caption: string;
  size: Size;
  /** True pixel size; absent where the view is slanted. */
  pixelSizeUm?: number;
  /** The file's own resolution states `pixelSizeUm`. */
  resolutionInFile: boolean;
  render(): Promise<RenderedPicture>;
}

export type Drawing = { picture: Picture; truth: PictureTruth };

/** How one picture is drawn; `quality` packs it as JPEG. */
export interface Entry extends Omit<DemoPicture, "mediaType" | "render"> {
  quality?: number;
  draw(size: Size): Drawing;
}

export const plain = (picture: Picture): Drawing => ({ picture, truth: {} });
export const scaled = (picture: ScaledPicture): Drawing => ({
  picture,
  truth: { scaleBar: picture.scaleBar },
});
export const face = (picture: FacePicture): Drawing => ({
  picture,
  truth: { face: picture.truth, scaleBar: picture.truth.scaleBar },
});

const MEDIA_TYPES: Record<string, ImageMediaType> = {
  jpg: "image/jpeg",
  png: "image/png",
  tif: "image/tiff",
};

/** Media type from the name, and the way to the file's bytes. */
export function demoPicture({ quality, draw, ...entry }: Entry): DemoPicture {
  const mediaType = MEDIA_TYPES[entry.fileName.split(".").at(-1) ?? ""];
  if (!mediaType) throw new Error(`No media type for ${entry.fileName}.`);
  const pixelSizeMm = entry.pixelSizeUm && entry.pixelSizeUm / 1000;
  return {
    ...entry,
    mediaType,
    async render() {
      const { picture, truth } = draw(entry.size);
      const stated = entry.resolutionInFile ? pixelSizeMm : undefined;
      const bytes = await encodePicture(picture, { mediaType, pixelSizeMm: stated, quality });
      return { bytes, truth };
    },
  };
}

/** Usual sizes of the three kinds of camera. */
export const SEM: Size = { width: 1280, height: 960 };
export const MICROGRAPH: Size = { width: 1600, height: 1200 };
export const CAMERA: Size = { width: 1840, height: 1380 };
