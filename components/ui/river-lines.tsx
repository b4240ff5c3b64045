import { RIVER_LINES } from "@/components/ui/river-lines-strands";

/** The large drawing beside the sign-in card: strands running together to the right edge, 420 of
 *  900 down. It stretches sideways; the lines keep their width. */
export function RiverLines({ className }: { className?: string }) {
  return (
    <svg
      viewBox="0 0 872 900"
      preserveAspectRatio="none"
      aria-hidden="true"
      className={className}
      fill="none"
      stroke="var(--ink)"
      opacity=".2"
      strokeLinecap="round"
    >
      {RIVER_LINES.map(({ width, strands }) => (
        <path
          key={width}
          d={strands.join("")}
          strokeWidth={width}
          vectorEffect="non-scaling-stroke"
        />
      ))}
    </svg>
  );
}
