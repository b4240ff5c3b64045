import type { MarkTool } from "@/lib/images/constants";

export const BENCH_TOOLS = [
  "move",
  "origin",
  "ratchet",
  "front",
  "area",
  "length",
  "angle",
  "count",
  "note",
  "scale",
] as const;
export type BenchTool = (typeof BENCH_TOOLS)[number];
export type DrawingTool = Exclude<BenchTool, "move">;

export const TOOL_WORDS: Record<BenchTool, string> = {
  move: "Move",
  origin: "Origin",
  ratchet: "Ratchet",
  front: "Front",
  area: "Area",
  length: "Length",
  angle: "Angle",
  count: "Count",
  note: "Note",
  scale: "Scale",
};

/** Letter that takes up a tool. */
export const TOOL_KEYS: Record<BenchTool, string> = {
  move: "v",
  origin: "o",
  ratchet: "r",
  front: "f",
  area: "a",
  length: "l",
  angle: "g",
  count: "c",
  note: "n",
  scale: "s",
};

/** What to do with a tool, in one sentence. */
export const TOOL_HELP: Record<DrawingTool, string> = {
  origin: "Press where the crack started.",
  ratchet: "For each ratchet mark press at the rim, then at its inner end.",
  front: "Press along the front from one end to the other.",
  area: "Press round the edge. Press the first point again to close it.",
  length: "Press both ends.",
  angle: "Press the end of one arm, the corner, then the end of the other arm.",
  count: "Press each one.",
  note: "Press where the note belongs, and write it.",
  scale: "Press both ends of a length that you know.",
};

const PATHS: Record<BenchTool, string> = {
  move: "M8 2v12M2 8h12M8 2 6.3 3.7M8 2l1.7 1.7M8 14l-1.7-1.7M8 14l1.7-1.7M2 8l1.7-1.7M2 8l1.7 1.7M14 8l-1.7-1.7M14 8l-1.7 1.7",
  origin: "M3 8a5 5 0 1 0 10 0a5 5 0 1 0-10 0M8 7.5v1M7.5 8h1",
  ratchet: "M2.5 13 6 9.5M5.5 5.5 9 7M8.5 14l1.5-3.5M11.5 2.5 12 6",
  front: "M2.5 13c1-6 5-9.5 11-10.5M6 13.5c1-3.5 3.5-5.7 7.5-6.5",
  area: "M3 4.5 9 2.5l4.5 5-2 5.5-7-.5z",
  length: "M2.5 13.5 13.5 2.5M1.5 11.5l3 3M11.5 1.5l3 3",
  angle: "M2.5 13h11M2.5 13 11 3.5M8 13a6 6 0 0 0-1.7-4.2",
  count: "M4 4h.1M8 3.5h.1M12.2 5h.1M3.5 8.5h.1M8.5 8h.1M12.5 9.5h.1M5 12.5h.1M9.5 12.5h.1",
  note: "M2.5 3h11v7.5h-6L4.6 13v-2.5H2.5z",
  scale: "M2 6v5M14 6v5M2 8.5h12M5 7.5v2M8 7v3M11 7.5v2",
};

export function ToolIcon({ tool, size = 20 }: { tool: BenchTool; size?: number }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 16 16"
      fill="none"
      stroke="currentColor"
      strokeWidth={tool === "count" ? 2 : 1.3}
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
    >
      <path d={PATHS[tool]} />
    </svg>
  );
}

/** The sign of a kind of mark in lists: its hue and its drawn form. */
export function MarkIcon({ tool }: { tool: MarkTool }) {
  return (
    <svg width="16" height="16" viewBox="0 0 16 16" fill="none" aria-hidden="true">
      {MARK_ICONS[tool]}
    </svg>
  );
}

const MARK_ICONS: Record<MarkTool, React.ReactNode> = {
  origin: (
    <>
      <circle cx="8" cy="8" r="5" stroke="var(--ib-origin)" strokeWidth="1.6" />
      <circle cx="8" cy="8" r="1.7" fill="var(--ib-origin)" />
    </>
  ),
  ratchet: (
    <path
      d="M2 13 8 3M8 13l6-10"
      stroke="var(--ib-origin)"
      strokeWidth="1.6"
      strokeDasharray="3 2"
    />
  ),
  front: <path d="M2 13C3 7 7 3.5 14 3" stroke="var(--ib-front)" strokeWidth="1.8" />,
  area: (
    <path
      d="M3 5 9 2.5l5 5-2 6-8-1z"
      fill="var(--ib-final)"
      fillOpacity=".25"
      stroke="var(--ib-final)"
      strokeWidth="1.5"
    />
  ),
  length: (
    <>
      <path d="M3 13 13 3" stroke="var(--ib-length)" strokeWidth="1.6" />
      <circle cx="3" cy="13" r="1.8" fill="var(--ib-length)" />
      <circle cx="13" cy="3" r="1.8" fill="var(--ib-length)" />
    </>
  ),
  angle: (
    <path
      d="M2.5 13h11M2.5 13 11 3.5M8 13a6 6 0 0 0-1.7-4.2"
      stroke="var(--ib-length)"
      strokeWidth="1.6"
    />
  ),
  count: (
    <>
      <circle cx="4" cy="5" r="1.7" fill="var(--ib-length)" />
      <circle cx="11" cy="4" r="1.7" fill="var(--ib-length)" />
      <circle cx="8" cy="11" r="1.7" fill="var(--ib-length)" />
    </>
  ),
  note: <path d="M2.5 3h11v7.5h-6L4.6 13v-2.5H2.5z" stroke="var(--ib-origin)" strokeWidth="1.5" />,
};
