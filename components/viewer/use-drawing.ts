"use client";

import { useState } from "react";
import type { Geometry } from "@/lib/images/mark-schemas";
import type { Point } from "@/lib/imaging/point";
import type { MarkWords } from "./draw-panel";
import { afterPress, PLAIN_OPTIONS, shapeOf } from "./drawing";
import { type BenchTool, TOOL_WORDS } from "./tools";
import { ontoPicture } from "./view";

const PLAIN_WORDS: MarkWords = { featureCode: null, name: "", confidence: "likely", note: "" };

type Given = {
  firstTool: BenchTool;
  size: { widthPx: number; heightPx: number };
  /** Whether presses count at this moment. */
  isOpen: (tool: BenchTool) => boolean;
  /** Saves a shape; answers whether it was. */
  onDone: (shape: Geometry, words: MarkWords) => Promise<boolean>;
  say: (words: string) => void;
};

/** The tool in hand and what is drawn with it so far, by mouse, finger or keys. */
export function useDrawing({ firstTool, size, isOpen, onDone, say }: Given) {
  const [tool, setTool] = useState<BenchTool>(firstTool);
  const [points, setPoints] = useState<readonly Point[]>([]);
  /** Where the arrow keys are; null while the mouse is used. */
  const [cross, setCross] = useState<Point | null>(null);
  /** Where the last shape ended, so that a second Enter there does not begin another. */
  const [endedAt, setEndedAt] = useState<Point | null>(null);
  const [options, setOptions] = useState(PLAIN_OPTIONS);
  const [words, setWords] = useState(PLAIN_WORDS);
  const shape = tool === "move" ? null : shapeOf(tool, points, options);

  function takeUp(next: BenchTool): void {
    setTool(next);
    setPoints([]);
    setCross(null);
    setEndedAt(null);
    setOptions(PLAIN_OPTIONS);
    setWords(PLAIN_WORDS);
    say(next === "move" ? "" : `${TOOL_WORDS[next]} tool`);
  }

  async function finish(drawn: Geometry | null): Promise<void> {
    if (!drawn || !isOpen(tool) || !(await onDone(drawn, words))) return;
    setPoints([]);
    setEndedAt(cross);
    setWords({ ...PLAIN_WORDS, featureCode: words.featureCode });
  }

  function press(at: Point, isSecond: boolean, scale: number): void {
    if (tool === "move" || !isOpen(tool)) return;
    const next = afterPress({ tool, points, options }, at, { isSecond, scale });
    if (next.points !== points) {
      setPoints(next.points);
      say(`Point ${next.points.length} set`);
    }
    void finish(next.done);
  }

  return {
    tool,
    points,
    cross,
    options,
    words,
    shape,
    takeUp,
    setOptions,
    setWords,
    takeBackPoint: () => setPoints(points.slice(0, -1)),
    finish: () => finish(shape),
    press: (at: Point, isSecond: boolean, scale: number) => {
      setCross(null);
      press(ontoPicture(at, size), isSecond, scale);
    },
    /** Moves the cross and answers where it is. */
    stepCross: ([x, y]: Point): Point => {
      const from = cross ?? [size.widthPx / 2, size.heightPx / 2];
      const to = ontoPicture([from[0] + x, from[1] + y], size);
      setCross(to);
      return to;
    },
    /** Enter: sets a point at the cross; a second time in one place ends the shape. */
    pressCross: (scale: number) => {
      if (!cross) return;
      const last = points.at(-1) ?? endedAt;
      press(cross, last !== null && last[0] === cross[0] && last[1] === cross[1], scale);
    },
  };
}
