import type { SVGProps } from "react";

export type ShapeName =
  "tick" | "triangle" | "lock" | "offline" | "cross" | "conflict" | "note" | "plus" | "chevron";

const PATHS: Record<ShapeName, string> = {
  tick: "m3.2 8.4 3.1 3.1 6.5-7",
  triangle: "M8 2.2 14.6 13.6H1.4zM8 6.4v3.4M8 11.4v.6",
  lock: "M3.5 8a1 1 0 0 1 1-1h7a1 1 0 0 1 1 1v4.5a1 1 0 0 1-1 1h-7a1 1 0 0 1-1-1zM5.3 7V5.2a2.7 2.7 0 0 1 5.4 0V7",
  offline:
    "M2 2l12 12M4.4 8.8a5 5 0 0 1 2.2-1.3M11.6 8.8c-.3-.3-.7-.5-1-.7M2.2 6.4a8 8 0 0 1 2.4-1.6M13.8 6.4A8 8 0 0 0 7.6 4M8 12h.1",
  cross: "m4 4 8 8M12 4l-8 8",
  conflict: "M2 4.5h4.5V13H2zM9.5 3H14v8.5H9.5zM6.5 8.8h3",
  note: "M8 2.2a5.8 5.8 0 1 0 0 11.6A5.8 5.8 0 0 0 8 2.2zM8 7.4v3.4M8 5v.4",
  plus: "M8 3v10M3 8h10",
  chevron: "m4.5 6.5 3.5 3.5 3.5-3.5",
};

/** A line shape on a 16 px grid. Decorative: the word beside it carries the meaning. */
export function Shape({
  name,
  size = 16,
  ...rest
}: { name: ShapeName; size?: number } & Omit<SVGProps<SVGSVGElement>, "name">) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 16 16"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.4"
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
      {...rest}
    >
      <path d={PATHS[name]} />
    </svg>
  );
}
