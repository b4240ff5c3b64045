import type { MarkTool } from "@/lib/images/constants";
import { labelPlace } from "@/lib/images/mark-layout";
import type { Geometry } from "@/lib/images/mark-schemas";
import { hueOf } from "./mark-shape";
import { toScreen, type View } from "./view";

const HEIGHT = 22;
const TURN = {
  over: [0, 0],
  below: [0, 1],
  above: [0, -1],
  left: [-1, 0],
  right: [1, 0],
} as const;

/** Label of a mark: coloured text on black, moved to where it covers least. */
export function MarkTag({
  caption,
  tool,
  geometry,
  view,
  strong,
}: {
  caption: string;
  tool: MarkTool;
  geometry: Geometry;
  view: View;
  strong?: boolean;
}) {
  const { at, side } = labelPlace(geometry);
  const [x, y] = toScreen(at, view);
  // Labels are short; Inter at this size is close to 7 px a letter.
  const width = Math.max(28, caption.length * 7 + 12);
  const away = tool === "origin" ? 30 : 14;
  const [turnX, turnY] = TURN[side];
  const left = x - width / 2 + turnX * (width / 2 + away);
  const top = y - HEIGHT / 2 + turnY * (HEIGHT / 2 + away - 8);
  const hue = hueOf(tool);
  return (
    <g>
      <rect
        x={left}
        y={top}
        width={width}
        height={HEIGHT}
        rx="2"
        fill="#000"
        stroke={hue}
        strokeWidth={strong ? 2 : 1}
      />
      <text
        x={left + width / 2}
        y={top + 15}
        textAnchor="middle"
        fontSize="12.5"
        fontWeight="620"
        fill={hue}
        className="tn"
      >
        {caption}
      </text>
    </g>
  );
}
