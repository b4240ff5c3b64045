import type { MarkTool } from "@/lib/images/constants";
import { HUE_OF_TOOL, markPath } from "@/lib/images/mark-layout";
import { type Geometry, pointsOf } from "@/lib/images/mark-schemas";
import { toScreen, type View } from "./view";

export const hueOf = (tool: MarkTool) => `var(--ib-${HUE_OF_TOOL[tool]})`;

/** Line of a mark on its casing; drawn in picture pixels, with strokes that keep their width. */
export function MarkShape({ geometry, strong }: { geometry: Geometry; strong?: boolean }) {
  const path = markPath(geometry);
  if (path === "") return null;
  const hue = hueOf(geometry.tool);
  const width = strong ? 2.4 : 1.8;
  const isDashed =
    geometry.tool === "ratchet" || (geometry.tool === "area" && geometry.isOutline === true);
  const isFilled = geometry.tool === "area" && geometry.isOutline !== true;
  return (
    <>
      {isFilled ? <path d={path} fill={hue} fillOpacity={strong ? 0.2 : 0.13} /> : null}
      <path
        d={path}
        fill="none"
        stroke="#000"
        strokeOpacity=".6"
        strokeWidth={width + 3}
        strokeLinejoin="round"
        vectorEffect="non-scaling-stroke"
      />
      <path
        d={path}
        fill="none"
        stroke={hue}
        strokeWidth={width}
        strokeLinejoin="round"
        strokeDasharray={isDashed ? "5 3" : undefined}
        vectorEffect="non-scaling-stroke"
      />
    </>
  );
}

/** Rings, dots and round ends of a mark, in screen pixels. */
export function MarkPoints({ geometry, view }: { geometry: Geometry; view: View }) {
  const hue = hueOf(geometry.tool);
  const all = pointsOf(geometry).map((point) => toScreen(point, view));
  switch (geometry.tool) {
    case "origin":
      return all.map(([x, y], i) => (
        <g key={i}>
          {i === 0 ? (
            <>
              <circle
                cx={x}
                cy={y}
                r="17"
                fill="none"
                stroke="#000"
                strokeOpacity=".6"
                strokeWidth="4.5"
              />
              <circle cx={x} cy={y} r="17" fill="none" stroke={hue} strokeWidth="1.8" />
              {geometry.radiusPx ? (
                <circle
                  cx={x}
                  cy={y}
                  r={geometry.radiusPx * view.scale}
                  fill="none"
                  stroke={hue}
                  strokeDasharray="3 3"
                />
              ) : null}
            </>
          ) : null}
          <circle cx={x} cy={y} r="3.2" fill={hue} stroke="#000" strokeWidth="1.5" />
          {i === 1 ? (
            <text
              x={x}
              y={y - 9}
              textAnchor="middle"
              fontSize="12"
              fill={hue}
              stroke="#000"
              strokeWidth="3"
              paintOrder="stroke"
            >
              {geometry.landmark?.name}
            </text>
          ) : null}
        </g>
      ));
    case "note":
    case "count":
      return all.map(([x, y], i) => (
        <circle key={i} cx={x} cy={y} r="4.5" fill={hue} stroke="#000" strokeWidth="1.5" />
      ));
    case "length":
      return [all[0], all.at(-1)].map((at, i) =>
        at ? (
          <circle key={i} cx={at[0]} cy={at[1]} r="4" fill="#000" stroke={hue} strokeWidth="1.8" />
        ) : null,
      );
    default:
      return null;
  }
}
