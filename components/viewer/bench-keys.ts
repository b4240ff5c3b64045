import type { Point } from "@/lib/imaging/point";
import { BENCH_TOOLS, type BenchTool, TOOL_KEYS, TOOL_WORDS } from "./tools";

/** What a key does on the bench. */
export type BenchKey =
  | { does: "takeUp"; tool: BenchTool }
  | { does: "step"; by: Point }
  | {
      does:
        | "undo"
        | "redo"
        | "zoomIn"
        | "zoomOut"
        | "whole"
        | "hide"
        | "leave"
        | "takeBack"
        | "set"
        | "keyList";
    };

const STEPS: Record<string, Point> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};
const FAR = 10;

const SIGNS: Record<string, Exclude<BenchKey["does"], "takeUp" | "step">> = {
  "+": "zoomIn",
  "=": "zoomIn",
  "-": "zoomOut",
  "0": "whole",
  h: "hide",
  "?": "keyList",
};

type Pressed = Pick<KeyboardEvent, "key" | "ctrlKey" | "metaKey" | "altKey" | "shiftKey">;

/** Reads a key; without `letters`, keys that print a sign do nothing (WCAG 2.1.4). */
export function readKey(event: Pressed, letters: boolean): BenchKey | null {
  const key = event.key.length === 1 ? event.key.toLowerCase() : event.key;
  if (event.altKey) return null;
  if (event.ctrlKey || event.metaKey) {
    if (key === "z") return { does: event.shiftKey ? "redo" : "undo" };
    return key === "y" ? { does: "redo" } : null;
  }
  const step = STEPS[key];
  if (step) {
    const by = event.shiftKey ? FAR : 1;
    return { does: "step", by: [step[0] * by, step[1] * by] };
  }
  if (key === "Escape") return { does: "leave" };
  if (key === "Backspace") return { does: "takeBack" };
  if (key === "Enter") return { does: "set" };
  if (!letters) return null;
  const tool = BENCH_TOOLS.find((known) => TOOL_KEYS[known] === key);
  if (tool) return { does: "takeUp", tool };
  const sign = SIGNS[key];
  return sign ? { does: sign } : null;
}

/** The keys in words, as the list on the bench shows them. */
export const KEY_LIST: readonly { keys: readonly string[]; does: string }[] = [
  ...BENCH_TOOLS.map((tool) => ({ keys: [TOOL_KEYS[tool].toUpperCase()], does: TOOL_WORDS[tool] })),
  { keys: ["Arrows"], does: "Move the cross, a point or the picture" },
  { keys: ["Shift", "Arrows"], does: "The same, ten times as far" },
  { keys: ["Enter"], does: "Set a point; twice in one place ends the shape" },
  { keys: ["Backspace"], does: "Take the last point away" },
  { keys: ["Esc"], does: "Put the tool down" },
  { keys: ["Ctrl", "Z"], does: "Undo" },
  { keys: ["Ctrl", "Shift", "Z"], does: "Redo" },
  { keys: ["+"], does: "Zoom in" },
  { keys: ["−"], does: "Zoom out" },
  { keys: ["0"], does: "Whole picture" },
  { keys: ["H"], does: "Hide or show the marks" },
  { keys: ["?"], does: "This list" },
];
