import { blurred } from "./blur";
import { drawFace } from "./draw-face";
import { fatigueCharacter, hoistShaftFace } from "./fracture-face";
import { lampVector } from "./light";
import { Noise, smoothstep } from "./noise";
import { createRaster, type Picture, type PixelPoint, type Raster, type Size } from "./picture";

/** How a shaft half lies before the camera. Lengths in millimetres. */
export interface ShaftScene {
  pixelSizeMm: number;
  /** Centre of the fracture face in the picture. */
  face: PixelPoint;
  /** Direction in which the shaft runs away, degrees counter-clockwise from 3 o'clock. */
  runsDeg: number;
  /** Angle between the line of sight and the shaft's axis. */
  turnDeg: number;
  journalMm: number;
  shoulderRadiusMm: number;
  shoulderMm: number;
  seed: number;
}

interface Hit {
  /** 0 face, 1 journal, 2 shoulder ring, 3 shoulder. */
  part: number;
  /** Along the axis, and across it in units of the radius. */
  axial: number;
  across: number;
}

/** Draws a broken shaft half on grey cloth, seen from in front and above. */
export function shaftScene(size: Size, scene: ShaftScene): Raster {
  const noise = new Noise(scene.seed + 21);
  const face = faceTexture(scene);
  const raster = createRaster(size, 3);
  const solid = createRaster(size, 1);
  const run = (scene.runsDeg * Math.PI) / 180;
  const turn = (scene.turnDeg * Math.PI) / 180;
  const ux = Math.cos(run);
  const uy = -Math.sin(run);
  const short = Math.cos(turn);
  const long = Math.sin(turn);
  const radius = hoistShaftFace.diameterMm / 2;
  const outer = scene.shoulderRadiusMm;
  const end = scene.journalMm + scene.shoulderMm;
  const light = lampVector({ azimuthDeg: 318, elevationDeg: 46 });
  const hit: Hit = { part: -1, axial: 0, across: 0 };

  const find = (p: number, q: number): void => {
    hit.part = -1;
    if ((p / short) ** 2 + q * q < radius * radius) {
      hit.part = 0;
      return;
    }
    if (Math.abs(q) < radius) {
      const axial = (p - short * Math.sqrt(radius * radius - q * q)) / long;
      if (axial > 0 && axial < scene.journalMm) {
        hit.part = 1;
        hit.axial = axial;
        hit.across = q / radius;
        return;
      }
    }
    const ring = p - scene.journalMm * long;
    if ((ring / short) ** 2 + q * q < outer * outer) {
      hit.part = 2;
      hit.across = Math.hypot(ring / short, q);
      return;
    }
    if (Math.abs(q) < outer) {
      const axial = (p - short * Math.sqrt(outer * outer - q * q)) / long;
      if (axial > scene.journalMm && axial < end) {
        hit.part = 3;
        hit.axial = axial;
        hit.across = q / outer;
      }
    }
  };

  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const dx = (x - scene.face.x) * scene.pixelSizeMm;
      const dy = (y - scene.face.y) * scene.pixelSizeMm;
      const p = dx * ux + dy * uy;
      const q = dy * ux - dx * uy;
      find(p, q);
      const i = y * size.width + x;
      if (hit.part < 0) continue;
      solid.data[i] = 1;
      if (hit.part === 0) {
        lookUp(face, p / short, q, radius, raster.data, 3 * i);
        continue;
      }
      const value =
        hit.part === 2
          ? ringShade(hit.across, outer, noise, light.z, p, q)
          : barrelShade(hit, noise, light, ux, uy, long, scene);
      const rust = stain(noise, hit, scene);
      raster.data[3 * i] = value * (1 - 0.12 * rust);
      raster.data[3 * i + 1] = value * (0.985 - 0.21 * rust);
      raster.data[3 * i + 2] = value * (0.965 - 0.3 * rust);
    }
  }
  layCloth(raster, solid, noise, scene.pixelSizeMm);
  return blurred(raster, 1);
}

/** The face square on, a little finer than the scene will show it. */
function faceTexture(scene: ShaftScene): Picture {
  const pixelSizeMm = scene.pixelSizeMm * 0.8;
  const side = Math.ceil((hoistShaftFace.diameterMm * 1.02) / pixelSizeMm);
  const size = { width: side, height: side };
  const view = { centre: { x: side / 2, y: side / 2 }, pixelSizeMm };
  const setting = { shape: hoistShaftFace, character: fatigueCharacter, view, grain: 0 };
  return drawFace(size, setting, scene.seed);
}

/** Bilinear sample of the face, `u` and `v` in millimetres from its centre. */
function lookUp(
  face: Picture,
  u: number,
  v: number,
  radius: number,
  out: Float32Array,
  at: number,
): void {
  const side = face.width;
  const scale = side / (2 * radius * 1.02);
  const x = Math.min(side - 2, Math.max(0, side / 2 + u * scale));
  const y = Math.min(side - 2, Math.max(0, side / 2 + v * scale));
  const x0 = Math.floor(x);
  const y0 = Math.floor(y);
  const fx = x - x0;
  const fy = y - y0;
  for (let channel = 0; channel < 3; channel++) {
    const i = 3 * (y0 * side + x0) + channel;
    const top = face.data[i]! * (1 - fx) + face.data[i + 3]! * fx;
    const low = i + 3 * side;
    const bottom = face.data[low]! * (1 - fx) + face.data[low + 3]! * fx;
    out[at + channel] = ((top * (1 - fy) + bottom * fy) / 255) * 1.04;
  }
}

function ringShade(
  from: number,
  outer: number,
  noise: Noise,
  facing: number,
  p: number,
  q: number,
): number {
  const grooves = noise.fbm(from / 0.35, Math.atan2(q, p) * 2, 3, 0.6);
  const edge = Math.exp(-((outer - from) / 0.5));
  const fillet = Math.exp(-Math.max(0, from - hoistShaftFace.diameterMm / 2) / 1.6);
  return 0.2 + 0.2 * facing + 0.06 * grooves + 0.2 * edge - 0.12 * fillet;
}

function barrelShade(
  hit: Hit,
  noise: Noise,
  light: { x: number; y: number; z: number },
  ux: number,
  uy: number,
  long: number,
  scene: ShaftScene,
): number {
  const out = Math.sqrt(1 - hit.across * hit.across);
  const nx = -hit.across * uy + 0.3 * out * ux * (1 - long);
  const ny = hit.across * ux + 0.3 * out * uy * (1 - long);
  const grooves =
    noise.fbm(hit.axial / 0.28, hit.across * 1.6, 3, 0.6) + 0.5 * noise.at(hit.axial / 2.2, 4);
  const towards = Math.max(0, nx * light.x + ny * light.y + out * light.z);
  const streak = Math.pow(towards, 14) * (0.75 + 0.2 * grooves);
  const room = 0.1 * smoothstep(0.45, 0.95, hit.across * ux + 0.1);
  const dents = Math.max(0, noise.fbm(hit.axial / 14 + 60, hit.across * 3, 6, 0.62) - 0.75);
  const joint = hit.part === 1 ? scene.journalMm - hit.axial : hit.axial - scene.journalMm;
  const ends = 0.16 * Math.exp(-joint / 1.4);
  const rim = hit.part === 1 ? 0.12 * Math.exp(-hit.axial / 0.7) : 0;
  return (
    0.13 + (0.36 + 0.05 * grooves) * towards + 0.42 * streak + room - 0.35 * dents - ends + rim
  );
}

function stain(noise: Noise, hit: Hit, scene: ShaftScene): number {
  if (hit.part === 2) return 0.2;
  const cloud = noise.fbm(hit.axial / 16 + 9, hit.across * 2.2 + 4, 6, 0.6);
  const seat = hit.part === 3 ? 0.25 : 0;
  const near = Math.exp(-Math.abs(hit.axial - scene.journalMm) / 6) * 0.5;
  return 0.85 * smoothstep(-0.1, 1.2, cloud + 0.6 * seat + near);
}

/** Woven grey cloth under the part, with a soft shadow to the lower right. */
function layCloth(raster: Raster, solid: Raster, noise: Noise, pixelSizeMm: number): void {
  const { width, height } = raster;
  const wide = blurred(solid, Math.round(9 / pixelSizeMm));
  const near = blurred(solid, Math.max(1, Math.round(2.2 / pixelSizeMm)));
  const shiftX = Math.round(7 / pixelSizeMm);
  const shiftY = Math.round(9 / pixelSizeMm);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const i = y * width + x;
      if (solid.data[i]! > 0) continue;
      const mx = x * pixelSizeMm + 1.4 * noise.fbm(x / 210, y / 210, 2);
      const my = y * pixelSizeMm + 1.4 * noise.fbm(x / 210 + 40, y / 210, 2);
      const weave = Math.sin(mx * 5.6) * Math.sin(my * 5.6 + mx * 0.4);
      const thread = noise.fbm(mx / 0.5, my / 0.5, 3, 0.6);
      const folds = noise.fbm(mx / 60, my / 44 + 7, 3, 0.45);
      const sx = Math.max(0, x - shiftX);
      const sy = Math.max(0, y - shiftY);
      const shadow = 0.55 * wide.data[sy * width + sx]! + 0.4 * near.data[i]!;
      const lamp = 0.5 - 0.1 * (x / width) - 0.06 * (y / height) + 0.05 * folds;
      const value = (lamp + 0.045 * weave + 0.06 * thread) * (1 - Math.min(0.82, shadow));
      raster.data[3 * i] = value * 0.975;
      raster.data[3 * i + 1] = value * 0.99;
      raster.data[3 * i + 2] = value * 1.01;
    }
  }
}
