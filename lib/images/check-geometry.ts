import "server-only";
import { AppError } from "@/lib/errors";
import { crossesItself } from "@/lib/imaging/crossing";
import { distancePx, polylineLengthPx } from "@/lib/imaging/point";
import { polygonAreaPx2 } from "@/lib/imaging/polygon";
import { type Geometry, pointsOf } from "./mark-schemas";

const refuse = (message: string) =>
  new AppError("INVALID", message, { fields: { geometry: message } });

/** @throws AppError INVALID when a shape lies outside the picture or measures nothing */
export function checkGeometry(
  geometry: Geometry,
  picture: { widthPx: number; heightPx: number },
): void {
  const outside = pointsOf(geometry).some(([x, y]) => x > picture.widthPx || y > picture.heightPx);
  if (outside) {
    throw refuse(
      `A point lies outside the picture, which is ${picture.widthPx} by ${picture.heightPx} px. The mark was not saved. Move the point onto the picture.`,
    );
  }
  if (geometry.tool === "area") {
    if (polygonAreaPx2(geometry.points) === 0) {
      throw refuse("All points of the area lie on one line. It was not saved. Move a point.");
    }
    if (crossesItself(geometry.points)) {
      throw refuse(
        "The edge of the area crosses itself, so it has no one area. It was not saved. Move the points so that the edge goes round once.",
      );
    }
  }
  if (
    (geometry.tool === "length" || geometry.tool === "front") &&
    polylineLengthPx(geometry.points) === 0
  ) {
    throw refuse("All points are in one place. The mark was not saved. Move a point.");
  }
  if (geometry.tool === "ratchet" && geometry.lines.some(([a, b]) => distancePx(a, b) === 0)) {
    throw refuse("A line has both ends in one place. The mark was not saved. Draw it longer.");
  }
  if (geometry.tool === "angle") {
    const [arm, corner, otherArm] = geometry.points;
    if (distancePx(arm, corner) === 0 || distancePx(corner, otherArm) === 0) {
      throw refuse("An arm of the angle has no length. It was not saved. Move its end.");
    }
  }
}
