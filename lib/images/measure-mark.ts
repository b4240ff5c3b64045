import "server-only";
import { DASH } from "@/lib/format/marks";
import { formatNumber, formatQuantity, formatWithUncertainty } from "@/lib/format/numbers";
import {
  angleDeg,
  anglePickUncertaintyDeg,
  bearingDeg,
  smallestArcDeg,
  wrapDeg,
} from "@/lib/imaging/angle";
import { areaMm2, lengthMm, type PixelSize } from "@/lib/imaging/calibration";
import { circleThrough, isRound, type Circle } from "@/lib/imaging/circle";
import { frontDepth } from "@/lib/imaging/front";
import { distancePx, polylineLengthPx, type Point } from "@/lib/imaging/point";
import { polygonAreaPx2, polygonPickUncertaintyPx2 } from "@/lib/imaging/polygon";
import {
  combined,
  COVERAGE_FACTOR,
  lengthPickUncertaintyPx,
  USUAL_PICK_UNCERTAINTY_PX,
} from "@/lib/imaging/uncertainty";
import { umFromMm } from "@/lib/units/length";
import type { Geometry, GeometryOf, Measurement } from "./mark-schemas";

/** What a mark can be measured against: the scale, the section outline and an origin, if marked. */
export type MeasuringGround = {
  scale: (PixelSize & { label: string }) | null;
  outline: { label: string; points: readonly Point[] } | null;
  origin: { label: string; point: Point } | null;
};
export const MEASURING_METHOD = { name: "Marks on pictures", version: "2" } as const;

const PICK_PX = USUAL_PICK_UNCERTAINTY_PX / COVERAGE_FACTOR;
const TWO_ENDS_PX = Math.SQRT2 * PICK_PX;
const NO_SCALE = "not calibrated";
const NO_OUTLINE = "no section outline";
const NOT_ROUND = "the section outline is not round";
/** Below these a length or an area reads better in micrometres. */
const SHORT_MM = 0.1;
const SMALL_MM2 = 0.01;

type Named = { key: string; label: string; basis?: string | null };

function refused({ key, label, basis }: Named, reason: string, unit: string): Measurement {
  return {
    key,
    label,
    value: null,
    unit,
    expandedUncertainty: null,
    text: DASH,
    basis: basis ?? null,
    refused: reason,
  };
}

function measured(
  { key, label, basis }: Named,
  value: number,
  expandedUncertainty: number | null,
  unit: string,
): Measurement {
  const text =
    expandedUncertainty === null
      ? formatQuantity(value, unit)
      : formatWithUncertainty(value, expandedUncertainty, unit);
  return {
    key,
    label,
    value,
    unit,
    expandedUncertainty,
    text,
    basis: basis ?? null,
    refused: null,
  };
}

function length(named: Named, px: number, pickPx: number, ground: MeasuringGround): Measurement {
  if (!ground.scale) return refused(named, NO_SCALE, "mm");
  const { value, expandedUncertainty } = lengthMm(px, pickPx, ground.scale);
  return value < SHORT_MM
    ? measured(named, umFromMm(value), umFromMm(expandedUncertainty), "µm")
    : measured(named, value, expandedUncertainty, "mm");
}

/** Values of a mark, the one quoted most first; each refused with its reason where it cannot be given. */
export function measureMark(geometry: Geometry, ground: MeasuringGround): Measurement[] {
  switch (geometry.tool) {
    case "origin":
      return [clockAngle(geometry, ground)];
    case "ratchet":
      return ratchetMarks(geometry, ground);
    case "front":
      return front(geometry, ground);
    case "area":
      return geometry.isOutline
        ? [area(geometry.points, ground)]
        : [share(geometry.points, ground), area(geometry.points, ground)];
    case "length":
      return [
        length(
          { key: "length", label: "Length" },
          polylineLengthPx(geometry.points),
          lengthPickUncertaintyPx(geometry.points, PICK_PX),
          ground,
        ),
      ];
    case "angle":
      return [angle(geometry)];
    case "count":
      return [measured({ key: "count", label: "Count" }, geometry.points.length, null, "")];
    case "note":
      return [];
  }
}

function rimOf(ground: MeasuringGround): Circle | string {
  if (!ground.outline) return NO_OUTLINE;
  const circle = circleThrough(ground.outline.points);
  return circle && isRound(circle, ground.outline.points) ? circle : NOT_ROUND;
}

function clockAngle(geometry: GeometryOf<"origin">, ground: MeasuringGround): Measurement {
  const named = {
    key: "clockAngle",
    label: "Clock angle",
    basis: geometry.landmark ? `from ${geometry.landmark.name}` : "from the top of the picture",
  };
  const rim = rimOf(ground);
  if (typeof rim === "string") return refused(named, rim, "°");
  const at = bearingDeg(rim.centre, geometry.point);
  const zero = geometry.landmark ? bearingDeg(rim.centre, geometry.landmark.point) : 0;
  if (at === null || zero === null) return refused(named, "it lies on the centre", "°");
  // The centre of a circle through many points is known much better than either pick.
  const pick = (point: Point) => (PICK_PX / distancePx(rim.centre, point)) * (180 / Math.PI);
  const spread = geometry.radiusPx
    ? (geometry.radiusPx / COVERAGE_FACTOR / distancePx(rim.centre, geometry.point)) *
      (180 / Math.PI)
    : 0;
  const landmark = geometry.landmark ? pick(geometry.landmark.point) : 0;
  const uncertainty = COVERAGE_FACTOR * combined(pick(geometry.point), landmark, spread);
  return measured(named, wrapDeg(at - zero), uncertainty, "°");
}

function ratchetMarks(geometry: GeometryOf<"ratchet">, ground: MeasuringGround): Measurement[] {
  const rim = rimOf(ground);
  const arcNamed = { key: "arc", label: "Spread on the rim" };
  const count = geometry.lines.length;
  const arc =
    typeof rim === "string"
      ? null
      : smallestArcDeg(geometry.lines.flatMap(([outer]) => bearingDeg(rim.centre, outer) ?? []));
  const uncertainty =
    typeof rim === "string"
      ? null
      : COVERAGE_FACTOR * (TWO_ENDS_PX / rim.radiusPx) * (180 / Math.PI);
  return [
    measured(
      {
        key: "count",
        label: "Count",
        basis: arc === null ? null : `over ${formatNumber(arc, { decimals: 0 })}° of rim`,
      },
      count,
      null,
      "",
    ),
    arc === null
      ? refused(arcNamed, typeof rim === "string" ? rim : "no line lies off the centre", "°")
      : measured(arcNamed, arc, uncertainty, "°"),
  ];
}

function front(geometry: GeometryOf<"front">, ground: MeasuringGround): Measurement[] {
  const depth = frontDepth(geometry.points, ground.origin?.point ?? null);
  const start = geometry.points[0];
  const end = geometry.points.at(-1);
  const named = {
    key: "depth",
    label: "Depth",
    basis:
      depth?.from === "origin" && ground.origin ? `from ${ground.origin.label}` : "from its chord",
  };
  const chordPx = start && end ? distancePx(start, end) : 0;
  return [
    depth
      ? length(named, depth.depthPx, TWO_ENDS_PX, ground)
      : refused(named, "both ends are one point", "mm"),
    length({ key: "chord", label: "Width between its ends" }, chordPx, TWO_ENDS_PX, ground),
    length(
      { key: "alongFront", label: "Length along the front" },
      polylineLengthPx(geometry.points),
      lengthPickUncertaintyPx(geometry.points, PICK_PX),
      ground,
    ),
  ];
}

function share(points: readonly Point[], ground: MeasuringGround): Measurement {
  const named = {
    key: "share",
    label: "Share of the section",
    basis: ground.outline ? `of ${ground.outline.label}` : null,
  };
  if (!ground.outline) return refused(named, NO_OUTLINE, "%");
  const whole = polygonAreaPx2(ground.outline.points);
  const part = polygonAreaPx2(points);
  const value = part / whole;
  const relative = combined(
    polygonPickUncertaintyPx2(points, PICK_PX) / part,
    polygonPickUncertaintyPx2(ground.outline.points, PICK_PX) / whole,
  );
  if (value > 1 + COVERAGE_FACTOR * relative) {
    return refused(named, "larger than the section outline", "%");
  }
  return measured(named, 100 * value, 100 * COVERAGE_FACTOR * value * relative, "%");
}

function area(points: readonly Point[], ground: MeasuringGround): Measurement {
  const named = { key: "area", label: "Area" };
  if (!ground.scale) return refused(named, NO_SCALE, "mm²");
  const { value, expandedUncertainty } = areaMm2(
    polygonAreaPx2(points),
    polygonPickUncertaintyPx2(points, PICK_PX),
    ground.scale,
  );
  const um2 = umFromMm(umFromMm(1));
  return value < SMALL_MM2
    ? measured(named, value * um2, expandedUncertainty * um2, "µm²")
    : measured(named, value, expandedUncertainty, "mm²");
}

function angle(geometry: GeometryOf<"angle">): Measurement {
  const named = { key: "angle", label: "Angle" };
  const value = angleDeg(...geometry.points);
  const pick = anglePickUncertaintyDeg(...geometry.points, PICK_PX);
  return value === null || pick === null
    ? refused(named, "an arm has no length", "°")
    : measured(named, value, COVERAGE_FACTOR * pick, "°");
}
