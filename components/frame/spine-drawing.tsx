import { DRAWING_WIDTH, NODE_X, type SpineGeometry } from "@/components/frame/spine-geometry";
import { StateDrawing, type PartState } from "@/components/ui/state-shape";

const STRANDS: Record<PartState, { stroke: string; width: number; dash?: string }> = {
  untouched: { stroke: "var(--control)", width: 1, dash: "2 3" },
  "under-way": { stroke: "var(--action)", width: 1.3, dash: "7 2.5" },
  complete: { stroke: "var(--action)", width: 1.3 },
  "needs-attention": { stroke: "var(--warn-mark)", width: 1.3 },
};

/** Nodes, strands and origin. Hidden from those who hear the page: the links say the same. */
export function SpineDrawing({
  geometry,
  states,
  currentIndex,
}: {
  geometry: SpineGeometry;
  states: readonly PartState[];
  currentIndex: number;
}) {
  const { height, originY, nodes } = geometry;
  return (
    <svg
      viewBox={`0 0 ${DRAWING_WIDTH} ${height}`}
      style={{ width: `${DRAWING_WIDTH / 16}rem`, height: `${height / 16}rem` }}
      className="pointer-events-none absolute top-0 left-0"
      aria-hidden="true"
    >
      {nodes.map(({ strand }, index) => {
        const { stroke, width, dash } = STRANDS[states[index] ?? "untouched"];
        return (
          <path
            key={strand}
            d={strand}
            fill="none"
            stroke={stroke}
            strokeWidth={width}
            strokeDasharray={dash}
          />
        );
      })}
      {nodes.map(({ y }, index) => (
        <g key={y} transform={`translate(${NODE_X - 7} ${y - 7})`}>
          <circle
            cx="7"
            cy="7"
            r="9.5"
            fill={index === currentIndex ? "var(--action-tint)" : "var(--surface-2)"}
          />
          <StateDrawing state={states[index] ?? "untouched"} />
        </g>
      ))}
      <circle cx={NODE_X} cy={originY} r="6.2" fill="var(--ink)" />
    </svg>
  );
}
