import { TILE_SIZE_PX } from "./constants";

export type PyramidShape = { widthPx: number; heightPx: number; scaleFactors: readonly number[] };

const QUALITY = "0/default.jpg";

/** Scale factors of a pyramid: halved until the picture fits one tile. */
export function scaleFactorsOf(widthPx: number, heightPx: number): number[] {
  const factors = [1];
  for (let factor = 1; Math.max(widthPx, heightPx) > factor * TILE_SIZE_PX;) {
    factor *= 2;
    factors.push(factor);
  }
  return factors;
}

/** Path of the picture in one tile at its smallest. */
export function wholePath({ widthPx, heightPx, scaleFactors }: PyramidShape): string {
  const factor = Math.max(...scaleFactors);
  return `full/${Math.ceil(widthPx / factor)},${Math.ceil(heightPx / factor)}/${QUALITY}`;
}

/** info.json of a level 0 service at `id` (IIIF Image API 3.0, section 5). */
export function infoJson(id: string, shape: PyramidShape): Record<string, unknown> {
  const factor = Math.max(...shape.scaleFactors);
  return {
    "@context": "http://iiif.io/api/image/3/context.json",
    id,
    type: "ImageService3",
    protocol: "http://iiif.io/api/image",
    profile: "level0",
    width: shape.widthPx,
    height: shape.heightPx,
    sizes: [
      { width: Math.ceil(shape.widthPx / factor), height: Math.ceil(shape.heightPx / factor) },
    ],
    tiles: [{ width: TILE_SIZE_PX, scaleFactors: [...shape.scaleFactors] }],
  };
}

/**
 * Path in the store of the tile that `path` asks for, or null when the pyramid has no such tile.
 * "max" is answered for pictures that fit one tile, since viewers ask for them so.
 */
export function tilePath(path: string, shape: PyramidShape): string | null {
  const whole = wholePath(shape);
  const isOneTile = shape.scaleFactors.length === 1;
  if (path === whole || (isOneTile && path === `full/max/${QUALITY}`)) return whole;
  const match =
    /^(\d{1,9}),(\d{1,9}),(\d{1,9}),(\d{1,9})\/(\d{1,4}),(\d{1,4})\/0\/default\.jpg$/.exec(path);
  if (!match) return null;
  const [x = 0, y = 0, width = 0, height = 0, sizeX = 0, sizeY = 0] = match.slice(1).map(Number);
  const isThere = shape.scaleFactors.some((factor) => {
    const step = factor * TILE_SIZE_PX;
    // At the smallest scale the whole picture is one tile, and is called "full".
    if (shape.widthPx <= step && shape.heightPx <= step) return false;
    return (
      x % step === 0 &&
      y % step === 0 &&
      x < shape.widthPx &&
      y < shape.heightPx &&
      width === Math.min(step, shape.widthPx - x) &&
      height === Math.min(step, shape.heightPx - y) &&
      sizeX === Math.ceil(width / factor) &&
      sizeY === Math.ceil(height / factor)
    );
  });
  return isThere ? [[x, y, width, height].join(","), `${sizeX},${sizeY}`, QUALITY].join("/") : null;
}
