import { describe, expect, it } from "vitest";
import { FaceGeometry, outlineArea } from "@/db/seed/pictures/face-geometry";
import { fractureFace, fractureFaceTruth, hoistShaftFace } from "@/db/seed/pictures/fracture-face";
import { HOIST_SEED, LARGE_FACE } from "@/db/seed/pictures/hoist-shaft-pictures";
import type { PixelPoint, Size } from "@/db/seed/pictures/picture";
import { boomPinFace, brakeBoltFace, springWireFace } from "@/db/seed/pictures/round-part-faces";

const inside = (point: PixelPoint, size: Size) =>
  point.x >= 0 && point.y >= 0 && point.x < size.width && point.y < size.height;

describe("fracture face of the hoist shaft", () => {
  const truth = fractureFaceTruth(LARGE_FACE, HOIST_SEED);
  const { centre, radiusPx } = truth.rim;
  const fromCentre = (point: PixelPoint) => Math.hypot(point.x - centre.x, point.y - centre.y);

  it("is drawn above 40 megapixels", () => {
    expect(LARGE_FACE.width * LARGE_FACE.height).toBeGreaterThan(40e6);
    expect(2 * radiusPx * truth.pixelSizeMm).toBeCloseTo(60, 6);
  });

  it("keeps every known point inside the picture", () => {
    const points = [
      truth.origin,
      truth.crackDepth.to,
      ...truth.fronts.flatMap((front) => front.points),
      ...truth.finalFracture.outline,
      ...truth.ratchets.flatMap((mark) => [mark.from, mark.to]),
      truth.scaleBar!.from,
      truth.scaleBar!.to,
    ];
    expect(points.filter((point) => !inside(point, LARGE_FACE))).toEqual([]);
  });

  it("lays fronts from rim to rim, each at its stated depth on the line of growth", () => {
    expect(truth.fronts.map((front) => front.depthMm)).toEqual([12.4, 22.3, 31.5, 38.6]);
    const along = {
      x: (centre.x - truth.origin.x) / radiusPx,
      y: (centre.y - truth.origin.y) / radiusPx,
    };
    for (const front of truth.fronts) {
      expect(fromCentre(front.points[0]!)).toBeCloseTo(radiusPx, 3);
      expect(fromCentre(front.points.at(-1)!)).toBeCloseTo(radiusPx, 3);
      // On the line of growth the front's distance from the origin is its depth; elsewhere it is more.
      const onLine = front.points.map((point) => {
        const dx = point.x - truth.origin.x;
        const dy = point.y - truth.origin.y;
        const aside = Math.abs(dx * along.y - dy * along.x) * truth.pixelSizeMm;
        return { aside, ahead: (dx * along.x + dy * along.y) * truth.pixelSizeMm };
      });
      const nearest = onLine.reduce((a, b) => (a.aside < b.aside ? a : b));
      expect(nearest.aside).toBeLessThan(1);
      expect(nearest.ahead).toBeCloseTo(front.depthMm, 1);
    }
  });

  it("has its origin at 222 degrees from the keyway and ratchet marks over 49 degrees", () => {
    const angle = Math.atan2(centre.y - truth.origin.y, truth.origin.x - centre.x);
    expect(((angle * 180) / Math.PI + 360) % 360).toBeCloseTo(222, 6);
    expect(truth.ratchets).toHaveLength(4);
    expect(truth.ratchetSpanDeg).toBeCloseTo(49, 6);
  });

  it("states a scale bar that agrees with the pixel size", () => {
    const { from, to, lengthMm } = truth.scaleBar!;
    expect(lengthMm).toBe(10);
    expect(Math.hypot(to.x - from.x, to.y - from.y) * truth.pixelSizeMm).toBeCloseTo(10, 9);
  });

  it("shows the final fracture where the outline says", () => {
    const size = { width: 420, height: 344 };
    const picture = fractureFace(size, HOIST_SEED);
    const { rim, origin } = picture.truth;
    const mean = (x: number, y: number) => {
      let sum = 0;
      for (let j = -6; j <= 6; j++) {
        for (let i = -6; i <= 6; i++) {
          sum += picture.data[3 * ((Math.round(y) + j) * size.width + Math.round(x) + i)]!;
        }
      }
      return sum / 169;
    };
    const toward = (share: number) =>
      mean(
        rim.centre.x + share * (rim.centre.x - origin.x),
        rim.centre.y + share * (rim.centre.y - origin.y),
      );
    // Along the line of growth the last front lies 0.4 radii past the centre.
    expect(toward(0.7)).toBeLessThan(0.85 * toward(0.1));
    expect(toward(1.12)).toBeLessThan(40);
  });
});

describe("final fracture share", () => {
  const shapes = { hoistShaftFace, springWireFace, boomPinFace, brakeBoltFace };
  it.each(Object.entries(shapes))("%s leaves its stated share", (_name, shape) => {
    for (const seed of [1, 7, 306]) {
      const geometry = new FaceGeometry(shape, seed);
      const section = Math.PI * geometry.radiusMm ** 2;
      const share = outlineArea(geometry.finalOutline()) / section;
      expect(Math.abs(share - shape.finalShare) / shape.finalShare).toBeLessThan(0.005);
    }
  });

  it("refuses a share that no front at the depth can leave", () => {
    expect(() => new FaceGeometry({ ...hoistShaftFace, finalShare: 0.1 }, 1)).toThrow(RangeError);
  });
});
