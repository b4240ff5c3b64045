import { blurred, outOfFocus } from "./blur";
import { Grain } from "./develop";
import { drawFace, type FacePicture, type FaceSetting } from "./draw-face";
import { fatigueCharacter, hoistShaftFace } from "./fracture-face";
import { createRaster, type Picture, type Size } from "./picture";

/** Part of the hoist shaft's face seen closer: middle of the view in millimetres and its width. */
interface Closer {
  xMm: number;
  yMm: number;
  widthMm: number;
  /** Where the lens loses focus: 0 nowhere, 1 in the corners, 2 further in. */
  softness: number;
}

function closeUp(size: Size, seed: number, look: Closer): FacePicture {
  const pixelSizeMm = Math.round((look.widthMm / size.width) * 1e5) / 1e5;
  const setting: FaceSetting = {
    shape: hoistShaftFace,
    character: fatigueCharacter,
    view: {
      centre: {
        x: size.width / 2 - look.xMm / pixelSizeMm,
        y: size.height / 2 - look.yMm / pixelSizeMm,
      },
      pixelSizeMm,
    },
    grain: 0,
  };
  const picture = drawFace(size, setting, seed);
  return { ...picture, data: throughLens(picture, look.softness, seed) };
}

/** Shallow depth of field and camera noise over a finished picture. */
function throughLens(picture: Picture, softness: number, seed: number): Uint8Array {
  const raster = createRaster(picture, picture.channels);
  raster.data.set(picture.data);
  const soft = blurred(raster, 1);
  const { width, height } = picture;
  outOfFocus(soft, Math.round(width / 170), (x, y) => {
    const from = Math.hypot(x / width - 0.5, (y / height - 0.5) * 0.8);
    return softness * (from - 0.26) * 1.7;
  });
  const grain = new Grain(seed + 44);
  const data = new Uint8Array(soft.data.length);
  for (let i = 0; i < data.length; i++) {
    const value = soft.data[i]!;
    data[i] = Math.min(
      255,
      Math.max(0, Math.round(value + 0.22 * Math.sqrt(value) * grain.next())),
    );
  }
  return data;
}

/** The main start at the rim, with the two ratchet marks beside it. */
export function fractureOrigin(size: Size, seed: number): FacePicture {
  return closeUp(size, seed, { xMm: -18.2, yMm: 15.8, widthMm: 18.4, softness: 1.2 });
}

/** Edge of the final fracture. */
export function fractureFinal(size: Size, seed: number): FacePicture {
  return closeUp(size, seed, { xMm: 14.5, yMm: -11.5, widthMm: 22.08, softness: 0.8 });
}

/** Beach marks in the middle of the section. */
export function fractureMiddle(size: Size, seed: number): FacePicture {
  return closeUp(size, seed, { xMm: -2.5, yMm: 1.5, widthMm: 22.08, softness: 0.8 });
}
