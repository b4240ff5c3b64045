"use client";

import { useMemo, useRef, useState, type KeyboardEvent, type PointerEvent } from "react";
import type { Chart, Readout } from "@/lib/charts/primitives";
import { SvgChart } from "./svg-chart";

/** The chart with the nearest reading said under it, by pointer and by arrow keys. */
export function ChartReadout({ chart }: { chart: Chart }) {
  const frame = useRef<HTMLDivElement>(null);
  const [at, setAt] = useState<number | null>(null);
  // Arrow keys walk the readings from left to right whatever order they were entered in.
  const readouts = useMemo(() => chart.readouts.toSorted((a, b) => a.x - b.x), [chart.readouts]);
  const shown = at === null ? undefined : readouts[at];

  function onKeyDown(event: KeyboardEvent) {
    const last = readouts.length - 1;
    const next = { ArrowRight: (at ?? -1) + 1, ArrowLeft: (at ?? 1) - 1, Home: 0, End: last }[
      event.key
    ];
    if (event.key === "Escape") setAt(null);
    if (next === undefined || last < 0) return;
    event.preventDefault();
    setAt(Math.min(last, Math.max(0, next)));
  }

  function onPointerMove(event: PointerEvent) {
    const box = frame.current?.getBoundingClientRect();
    if (!box || box.width === 0) return;
    const scale = chart.widthPx / box.width;
    const x = (event.clientX - box.left) * scale;
    const y = (event.clientY - box.top) * scale;
    setAt(nearest(readouts, x, y));
  }

  return (
    <div>
      <div
        ref={frame}
        tabIndex={0}
        role="group"
        aria-label={`${chart.title}. Left and right arrow keys read the points.`}
        onKeyDown={onKeyDown}
        onPointerMove={onPointerMove}
        onPointerLeave={() => setAt(null)}
        className="relative"
        style={{ maxWidth: chart.widthPx }}
      >
        <SvgChart chart={chart} />
        {shown && <Ring chart={chart} readout={shown} />}
      </div>
      <p aria-live="polite" className="min-h-4 px-1 text-12 text-ink-2 tabular-nums">
        {shown?.text ?? ""}
      </p>
    </div>
  );
}

function Ring({ chart, readout }: { chart: Chart; readout: Readout }) {
  return (
    <svg
      aria-hidden="true"
      viewBox={`0 0 ${chart.widthPx} ${chart.heightPx}`}
      className="pointer-events-none absolute inset-0 h-full w-full"
    >
      <circle
        cx={readout.x}
        cy={readout.y}
        r={7}
        fill="none"
        stroke="var(--focus)"
        strokeWidth={2}
      />
    </svg>
  );
}

const REACH_PX = 28;

function nearest(readouts: readonly Readout[], x: number, y: number): number | null {
  let best: number | null = null;
  let bestDistance = REACH_PX;
  readouts.forEach((readout, index) => {
    const distance = Math.hypot(readout.x - x, readout.y - y);
    if (distance < bestDistance) {
      best = index;
      bestDistance = distance;
    }
  });
  return best;
}
