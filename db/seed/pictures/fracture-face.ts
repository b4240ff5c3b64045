import { drawFace, type FacePicture, type FaceSetting } from "./draw-face";
import { FaceGeometry, type FaceShape } from "./face-geometry";
import type { FaceCharacter } from "./face-surface";
import { faceTruth, type FaceTruth } from "./face-truth";
import type { Size } from "./picture";
import { ruleScale } from "./rule";

/** Rotating bending of a hoist shaft at a journal fillet: several starts, one dominant crack. */
export const hoistShaftFace: FaceShape = {
  diameterMm: 60,
  originAngleDeg: 222,
  frontDepthsMm: [12.4, 22.3, 31.5, 38.6],
  crackDepthMm: 42,
  finalShare: 0.277,
  ratchets: [
    { angleDeg: 201.3, lengthMm: 4.5, leanDeg: 5 },
    { angleDeg: 214.1, lengthMm: 4.6, leanDeg: 2 },
    { angleDeg: 235.2, lengthMm: 4.4, leanDeg: -4 },
    { angleDeg: 250.3, lengthMm: 4.7, leanDeg: -7 },
  ],
};

export const fatigueCharacter: FaceCharacter = {
  fatigueRelief: 1,
  finalRelief: 1,
  finalRays: 0,
  beach: 1,
  oxide: 0,
};

/** Diameter and margins, so that the whole face fits the height of the picture. */
const FACE_AND_MARGIN = 1.1;

/** A whole face seen square on, with a 10 mm steel rule at the lower left. */
export function wholeFace(size: Size, shape: FaceShape, character: FaceCharacter): FaceSetting {
  const pixelSizeMm = Math.round(((FACE_AND_MARGIN * shape.diameterMm) / size.height) * 1e6) / 1e6;
  const small = shape.diameterMm / 60;
  return {
    shape,
    character,
    view: { centre: { x: Math.round(size.width * 0.53), y: size.height / 2 }, pixelSizeMm },
    rule: {
      corner: {
        x: Math.round(0.018 * size.width),
        y: Math.round(size.height - (5.2 * small) / pixelSizeMm),
      },
      pixelSizeMm,
      lengthMm: small < 0.5 ? 2 : 10,
      heightMm: 4 * small,
      numberEveryMm: small < 0.5 ? 1 : 5,
    },
    grain: 0.008,
  };
}

/** The whole section of the hoist shaft, as large as the picture allows, with a steel rule. */
export function fractureFace(size: Size, seed: number): FacePicture {
  return drawFace(size, wholeFace(size, hoistShaftFace, fatigueCharacter), seed);
}

/** What `fractureFace` would hold, without drawing it. */
export function fractureFaceTruth(size: Size, seed: number): FaceTruth {
  const { shape, view, rule } = wholeFace(size, hoistShaftFace, fatigueCharacter);
  return faceTruth(new FaceGeometry(shape, seed), view, rule && ruleScale(rule));
}
