import { Noise } from "./noise";
import type { PixelPoint } from "./picture";

/** Ratchet mark: where it meets the rim and how far it runs inward. */
export interface Ratchet {
  angleDeg: number;
  lengthMm: number;
  leanDeg: number;
}

/** A round fracture face with one dominant fatigue crack. Angles run counter-clockwise from 3 o'clock. */
export interface FaceShape {
  diameterMm: number;
  originAngleDeg: number;
  /** Depths of the fronts that can be seen, from the origin towards the centre. */
  frontDepthsMm: readonly number[];
  /** Depth of the last front. */
  crackDepthMm: number;
  /** Share of the section beyond the last front, 0 to 1. */
  finalShare: number;
  ratchets: readonly Ratchet[];
}

/** Where in millimetres, x right and y down from the centre of the section. */
export interface FacePoint {
  x: number;
  y: number;
}

const RIM_STEPS = 96;
const FRONT_STEPS = 32;

/**
 * Crack fronts of a face. Each is an arc that flattens as it grows: at depth a its radius is
 * a + k a², and k is chosen so that the last one leaves the stated final share.
 */
export class FaceGeometry {
  readonly radiusMm: number;
  readonly origin: FacePoint;
  /** Unit vector of growth from the origin, and the one across it. */
  readonly along: FacePoint;
  readonly across: FacePoint;
  private flattening = 0;
  private readonly waver: Noise;

  constructor(
    readonly shape: FaceShape,
    seed: number,
  ) {
    this.radiusMm = shape.diameterMm / 2;
    const angle = (shape.originAngleDeg * Math.PI) / 180;
    this.along = { x: -Math.cos(angle), y: Math.sin(angle) };
    this.across = { x: -this.along.y, y: this.along.x };
    this.origin = { x: -this.along.x * this.radiusMm, y: -this.along.y * this.radiusMm };
    this.waver = new Noise(seed + 71);
    this.flattening = this.solveFlattening();
  }

  /** Depth of the front that passes through a point; `guess` is a nearby answer, if there is one. */
  depthAt(u: number, v: number, guess = 0): number {
    const k = this.flattening;
    const reach = u * u + v * v;
    let a = guess;
    let steps = 2;
    if (guess <= 0) {
      a = Math.sqrt(reach) + 1e-6;
      steps = 8;
    }
    const square = 1 - 2 * k * u;
    for (let i = 0; i < steps; i++) {
      const value = (2 * k * a + square) * a * a - reach;
      const slope = (6 * k * a + 2 * square) * a;
      a -= value / slope;
    }
    return a;
  }

  /** Slow sideways waver of the fronts, none on the line of growth so that depths stay exact. */
  waverAt(u: number, v: number): number {
    const size = this.radiusMm;
    const fade = 1 - Math.exp(-(v * v) / (0.02 * size * size));
    return 0.02 * size * fade * this.waver.fbm((2.1 * u) / size, (2.1 * v) / size, 2);
  }

  /** Signed angle from the line of growth seen from the origin, and back to millimetres. */
  private fromOrigin(psi: number, distance: number): FacePoint {
    const u = distance * Math.cos(psi);
    const v = distance * Math.sin(psi);
    return {
      x: this.origin.x + u * this.along.x + v * this.across.x,
      y: this.origin.y + u * this.along.y + v * this.across.y,
    };
  }

  private frontAt(psi: number, distance: number): number {
    const u = distance * Math.cos(psi);
    const v = distance * Math.sin(psi);
    return this.depthAt(u, v) + this.waverAt(u, v);
  }

  /** Angle, seen from the origin, at which a front meets the rim on one side (-1 or 1). */
  private rimAngle(depth: number, side: number): number {
    let inner = 0;
    let outer = Math.PI / 2;
    for (let i = 0; i < 50; i++) {
      const middle = (inner + outer) / 2;
      const chord = 2 * this.radiusMm * Math.cos(middle);
      if (this.frontAt(side * middle, chord) > depth) inner = middle;
      else outer = middle;
    }
    return (side * (inner + outer)) / 2;
  }

  /** A front as points in millimetres from rim to rim. */
  front(depth: number, steps = FRONT_STEPS): FacePoint[] {
    const first = this.rimAngle(depth, -1);
    const last = this.rimAngle(depth, 1);
    const points: FacePoint[] = [];
    for (let i = 0; i <= steps; i++) {
      const psi = first + ((last - first) * i) / steps;
      let low = 0;
      let high = 2 * this.radiusMm * Math.cos(psi);
      for (let step = 0; step < 50; step++) {
        const middle = (low + high) / 2;
        if (this.frontAt(psi, middle) < depth) low = middle;
        else high = middle;
      }
      points.push(this.fromOrigin(psi, (low + high) / 2));
    }
    return points;
  }

  /** Outline of the final fracture: the last front, then back along the rim. */
  finalOutline(): FacePoint[] {
    const depth = this.shape.crackDepthMm;
    const first = this.rimAngle(depth, -1);
    const last = this.rimAngle(depth, 1);
    const rim: FacePoint[] = [];
    for (let i = 1; i < RIM_STEPS; i++) {
      const psi = last + ((first - last) * i) / RIM_STEPS;
      rim.push(this.fromOrigin(psi, 2 * this.radiusMm * Math.cos(psi)));
    }
    return [...this.front(depth), ...rim];
  }

  private solveFlattening(): number {
    const wanted = this.shape.finalShare * Math.PI * this.radiusMm * this.radiusMm;
    let low = 1e-4;
    let high = 1;
    for (let i = 0; i < 40; i++) {
      this.flattening = Math.sqrt(low * high);
      if (outlineArea(this.finalOutline()) > wanted) low = this.flattening;
      else high = this.flattening;
    }
    const area = outlineArea(this.finalOutline());
    if (Math.abs(area - wanted) > 0.002 * wanted) {
      const straight = (100 * area) / (Math.PI * this.radiusMm * this.radiusMm);
      throw new RangeError(
        `No front at this depth leaves the final share; the nearest leaves ${straight.toFixed(1)} %.`,
      );
    }
    return this.flattening;
  }
}

/** Area inside a closed outline. */
export function outlineArea(outline: readonly PixelPoint[]): number {
  let twice = 0;
  outline.forEach((point, i) => {
    const next = outline[(i + 1) % outline.length]!;
    twice += point.x * next.y - next.x * point.y;
  });
  return Math.abs(twice) / 2;
}

/** End of a ratchet mark on the rim and its inner end, in millimetres. */
export function ratchetLine(geometry: FaceGeometry, mark: Ratchet): [FacePoint, FacePoint] {
  const angle = (mark.angleDeg * Math.PI) / 180;
  const from = {
    x: geometry.radiusMm * Math.cos(angle),
    y: -geometry.radiusMm * Math.sin(angle),
  };
  const inward = angle + Math.PI + (mark.leanDeg * Math.PI) / 180;
  return [
    from,
    {
      x: from.x + mark.lengthMm * Math.cos(inward),
      y: from.y - mark.lengthMm * Math.sin(inward),
    },
  ];
}
