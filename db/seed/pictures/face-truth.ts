import { outlineArea, ratchetLine, type FaceGeometry, type FacePoint } from "./face-geometry";
import type { PixelPoint, ScaleBar } from "./picture";

/** What is really in the picture, in pixels. */
export interface FaceTruth {
  pixelSizeMm: number;
  rim: { centre: PixelPoint; radiusPx: number };
  /** Unit vector in the picture towards the keyway, from which the origin's angle is counted. */
  keywayDirection: PixelPoint;
  origin: PixelPoint;
  originAngleDeg: number;
  fronts: Array<{ name: string; depthMm: number; points: PixelPoint[] }>;
  /** From the origin straight to the middle of the last front. */
  crackDepth: { from: PixelPoint; to: PixelPoint; depthMm: number };
  finalFracture: { outline: PixelPoint[]; sharePercent: number };
  ratchets: Array<{ from: PixelPoint; to: PixelPoint }>;
  ratchetSpanDeg: number;
  scaleBar?: ScaleBar;
}

/** Where the section's centre falls in a picture, and its pixel size. */
export interface FaceView {
  centre: PixelPoint;
  pixelSizeMm: number;
}

/** The geometry as it lies in a picture. */
export function faceTruth(geometry: FaceGeometry, view: FaceView, scaleBar?: ScaleBar): FaceTruth {
  const { shape } = geometry;
  const toPixel = (point: FacePoint): PixelPoint => ({
    x: view.centre.x + point.x / view.pixelSizeMm,
    y: view.centre.y + point.y / view.pixelSizeMm,
  });
  const outline = geometry.finalOutline().map(toPixel);
  const radiusPx = geometry.radiusMm / view.pixelSizeMm;
  const tip = {
    x: geometry.origin.x + shape.crackDepthMm * geometry.along.x,
    y: geometry.origin.y + shape.crackDepthMm * geometry.along.y,
  };
  const angles = shape.ratchets.map((mark) => mark.angleDeg);
  return {
    pixelSizeMm: view.pixelSizeMm,
    rim: { centre: view.centre, radiusPx },
    keywayDirection: { x: 1, y: 0 },
    origin: toPixel(geometry.origin),
    originAngleDeg: shape.originAngleDeg,
    fronts: shape.frontDepthsMm.map((depthMm, i) => ({
      name: `B${i + 1}`,
      depthMm,
      points: geometry.front(depthMm).map(toPixel),
    })),
    crackDepth: {
      from: toPixel(geometry.origin),
      to: toPixel(tip),
      depthMm: shape.crackDepthMm,
    },
    finalFracture: {
      outline,
      sharePercent: (100 * outlineArea(outline)) / (Math.PI * radiusPx * radiusPx),
    },
    ratchets: shape.ratchets.map((mark) => {
      const [from, to] = ratchetLine(geometry, mark).map(toPixel) as [PixelPoint, PixelPoint];
      return { from, to };
    }),
    ratchetSpanDeg: angles.length > 0 ? Math.max(...angles) - Math.min(...angles) : 0,
    scaleBar,
  };
}
