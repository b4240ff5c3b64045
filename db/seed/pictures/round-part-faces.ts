import { drawFace, type FacePicture } from "./draw-face";
import type { FaceShape } from "./face-geometry";
import { fatigueCharacter, wholeFace } from "./fracture-face";
import type { Size } from "./picture";

/** Coil spring wire, 12 mm: a small crack from a corrosion pit, then fast fracture. */
export const springWireFace: FaceShape = {
  diameterMm: 12,
  originAngleDeg: 168,
  frontDepthsMm: [0.9, 1.7],
  crackDepthMm: 2.6,
  finalShare: 0.885,
  ratchets: [{ angleDeg: 160, lengthMm: 0.5, leanDeg: -6 }],
};

/** Boom pin, 50 mm: reversed bending from the grease hole's mouth, deep crack, small final zone. */
export const boomPinFace: FaceShape = {
  diameterMm: 50,
  originAngleDeg: 97,
  frontDepthsMm: [9.5, 19, 27.5, 35],
  crackDepthMm: 40.5,
  finalShare: 0.152,
  ratchets: [
    { angleDeg: 86, lengthMm: 3.1, leanDeg: -4 },
    { angleDeg: 109, lengthMm: 3.4, leanDeg: 5 },
  ],
};

/** Brake disc bolt M14, thread root 11.6 mm: loose joint, many starts, crack through most of the section. */
export const brakeBoltFace: FaceShape = {
  diameterMm: 11.6,
  originAngleDeg: 305,
  frontDepthsMm: [2.4, 4.6, 6.4],
  crackDepthMm: 7.6,
  finalShare: 0.345,
  ratchets: [
    { angleDeg: 276, lengthMm: 0.7, leanDeg: 5 },
    { angleDeg: 290, lengthMm: 0.8, leanDeg: 3 },
    { angleDeg: 318, lengthMm: 0.8, leanDeg: -3 },
    { angleDeg: 333, lengthMm: 0.7, leanDeg: -6 },
    { angleDeg: 346, lengthMm: 0.6, leanDeg: -8 },
  ],
};

/** Face of a broken spring wire: oxidised crack at the rim, rays through the rest, shear lip opposite. */
export function springFracture(size: Size, seed: number): FacePicture {
  const character = {
    fatigueRelief: 0.7,
    finalRelief: 0.5,
    finalRays: 0.5,
    beach: 0.8,
    oxide: 0.75,
  };
  return drawFace(size, wholeFace(size, springWireFace, character), seed);
}

export function boomPinFracture(size: Size, seed: number): FacePicture {
  const character = { ...fatigueCharacter, oxide: 0.22, fatigueRelief: 0.8 };
  return drawFace(size, wholeFace(size, boomPinFace, character), seed);
}

export function brakeBoltFracture(size: Size, seed: number): FacePicture {
  const character = { ...fatigueCharacter, oxide: 0.12, fatigueRelief: 1.2, finalRelief: 1.15 };
  return drawFace(size, wholeFace(size, brakeBoltFace, character), seed);
}
