import { Grain } from "./develop";
import type { FaceShape } from "./face-geometry";
import { FaceSurface, type FaceCharacter, type FaceSample } from "./face-surface";
import { faceTruth, type FaceTruth, type FaceView } from "./face-truth";
import { lampVector } from "./light";
import { Noise, smoothstep } from "./noise";
import type { Picture, Size } from "./picture";
import { drawRule, type RulePlace } from "./rule";

/** How a face is photographed. */
export interface FaceSetting {
  shape: FaceShape;
  character: FaceCharacter;
  view: FaceView;
  /** A steel rule lying beside the face. */
  rule?: RulePlace;
  /** Noise of the camera as a share of white. */
  grain: number;
}

export interface FacePicture extends Picture {
  truth: FaceTruth;
}

interface Row {
  height: Float32Array;
  tone: Float32Array;
  tint: Float32Array;
  gloss: Float32Array;
  /** 0 outside the rim, 1 inside. */
  cover: Float32Array;
}

function createRow(width: number): Row {
  return {
    height: new Float32Array(width),
    tone: new Float32Array(width),
    tint: new Float32Array(width),
    gloss: new Float32Array(width),
    cover: new Float32Array(width),
  };
}

/** Draws any window of a face, row by row: three rows of heights and the finished samples are all it keeps. */
export function drawFace(size: Size, setting: FaceSetting, seed: number): FacePicture {
  const { width, height } = size;
  const { view } = setting;
  const surface = new FaceSurface(setting.shape, setting.character, view.pixelSizeMm, seed);
  const edge = new Noise(seed + 8);
  const cloth = new Noise(seed + 9);
  const grain = new Grain(seed + 10);
  const light = lampVector({ azimuthDeg: 312, elevationDeg: 33 });
  const halfLength = Math.hypot(light.x, light.y, light.z + 1);
  const radius = surface.geometry.radiusMm;
  const unit = setting.shape.diameterMm / 60;
  const px = view.pixelSizeMm;
  // A clamped array rounds and clips by itself, which is quicker than doing so here.
  const data = new Uint8ClampedArray(width * height * 3);
  const sample: FaceSample = { height: 0, tone: 0, tint: 0, final: 0, gloss: 0 };

  const fill = (row: Row, y: number): void => {
    const my = (y - view.centre.y) * px;
    surface.startRow();
    for (let x = 0; x < width; x++) {
      const mx = (x - view.centre.x) * px;
      const from = Math.sqrt(mx * mx + my * my);
      if (from > radius + 0.5 * unit) {
        row.cover[x] = 0;
        row.height[x] = -1;
        surface.startRow();
        continue;
      }
      const nick = from > radius - unit ? 0.07 * unit * edge.fbm(mx / unit, my / unit, 3) : 0;
      const inside = radius - from + nick - 0.04 * unit;
      row.cover[x] = smoothstep(-0.06 * unit, 0.1 * unit, inside);
      surface.sample(mx, my, sample);
      const bevel = inside < 0.3 * unit ? (0.3 * unit - inside) * 0.5 : 0;
      row.height[x] = sample.height - bevel;
      row.tone[x] = sample.tone;
      row.tint[x] = sample.tint;
      row.gloss[x] = sample.gloss;
    }
  };

  let above = createRow(width);
  let here = createRow(width);
  let below = createRow(width);
  fill(above, -1);
  fill(here, 0);
  const reach = width * width + height * height;
  // The cloth is soft, so its brightness is found only every 0.04 mm.
  const clothStep = Math.max(1, Math.floor((0.04 * unit) / px));
  let behind = 0;
  for (let y = 0; y < height; y++) {
    fill(below, y + 1);
    let clothUntil = 0;
    const my = (y - view.centre.y) * px;
    for (let x = 0; x < width; x++) {
      const mx = (x - view.centre.x) * px;
      const cover = here.cover[x]!;
      let value = 0;
      let tint = 0;
      if (cover > 0) {
        const left = here.height[Math.max(0, x - 1)]!;
        const right = here.height[Math.min(width - 1, x + 1)]!;
        const gx = (right - left) / (2 * px);
        const gy = (below.height[x]! - above.height[x]!) / (2 * px);
        const length = Math.sqrt(1 + gx * gx + gy * gy);
        const towards = (light.z - gx * light.x - gy * light.y) / length;
        const half = (light.z + 1 - gx * light.x - gy * light.y) / (length * halfLength);
        const direct = towards > 0 ? towards : 0.1 * towards;
        const glint = half * half * half * half;
        const shine = here.gloss[x]! * glint * glint * glint;
        // The lamp stands close by, so the side towards it is brighter.
        const nearness = 1 - 0.16 * ((mx * -light.x + my * -light.y) / radius);
        value = (here.tone[x]! * (0.2 + 1.42 * direct) + shine * 0.5) * nearness * cover;
        tint = here.tint[x]! * cover;
      }
      if (cover < 1) {
        if (x >= clothUntil) {
          behind = background(mx, my, radius, unit, cloth);
          clothUntil = x + clothStep;
        }
        value += (1 - cover) * behind;
      }
      const ox = 2 * x - width;
      const oy = 2 * y - height;
      value *= 1 - (0.2 * (ox * ox + oy * oy)) / reach;
      value = value > 0.82 ? 0.82 + 0.18 * Math.tanh((value - 0.82) / 0.18) : value;
      value += setting.grain * (0.25 + Math.sqrt(value < 0 ? 0 : value)) * grain.next();
      const out = 3 * (y * width + x);
      data[out] = value * (1.015 - 0.06 * tint) * 255;
      data[out + 1] = value * (0.982 - 0.145 * tint) * 255;
      data[out + 2] = value * (0.936 - 0.33 * tint) * 255;
    }
    const spare = above;
    above = here;
    here = below;
    below = spare;
  }

  const picture: Picture = { width, height, channels: 3, data: new Uint8Array(data.buffer) };
  const scaleBar = setting.rule ? drawRule(picture, setting.rule, seed + 11) : undefined;
  return { ...picture, truth: faceTruth(surface.geometry, view, scaleBar) };
}

/** Dark cloth, with a little light thrown on it by the part. */
function background(mx: number, my: number, radius: number, unit: number, cloth: Noise): number {
  const out = Math.max(0, Math.sqrt(mx * mx + my * my) - radius) / unit;
  const glow = 0.05 * Math.exp(-out / 0.7) + 0.02 * Math.exp(-out / 4);
  return 0.05 + glow + 0.006 * cloth.at(mx / (0.6 * unit), my / (0.6 * unit));
}
