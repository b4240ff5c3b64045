"use client";

import type { PointerEvent } from "react";
import type { BenchMark } from "@/lib/images/bench-state";
import { markPath } from "@/lib/images/mark-layout";
import { type Geometry, pointsOf } from "@/lib/images/mark-schemas";
import type { Point } from "@/lib/imaging/point";
import { MarkPoints, MarkShape } from "./mark-shape";
import { MarkTag } from "./mark-tag";
import type { Editing } from "./use-point-edits";
import { toPicture, toScreen, type View } from "./view";

type Props = {
  view: View;
  marks: readonly BenchMark[];
  chosenId: string | null;
  /** The mark whose points are being moved; null otherwise. */
  editing: Editing | null;
  drawn: { shape: Geometry | null; points: readonly Point[] };
  /** Cross for marking by keys; null while the mouse is used. */
  cross: Point | null;
  canChoose: boolean;
  onChoose: (id: string) => void;
  onChoosePoint: (index: number) => void;
  onMovePoint: (to: Point, index: number) => void;
};

/** Marks over the picture: shapes in its pixels, labels and handles in those of the screen. */
export function MarkLayer({
  view,
  marks,
  chosenId,
  editing,
  drawn,
  cross,
  canChoose,
  onChoose,
  onChoosePoint,
  onMovePoint,
}: Props) {
  const shown = marks.map((mark) => ({
    mark,
    geometry: mark.id === editing?.mark.id ? editing.geometry : mark.content.geometry,
    isChosen: mark.id === chosenId,
    // Origins, notes and counts have no line to press, so the points and the label are pressed too.
    press: canChoose && {
      className: "pointer-events-auto cursor-pointer",
      onPointerDown: (event: PointerEvent) => {
        event.stopPropagation();
        onChoose(mark.id);
      },
    },
  }));
  const crossAt = cross && toScreen(cross, view);
  return (
    <svg className="pointer-events-none absolute inset-0 size-full" aria-hidden="true">
      <g transform={`translate(${view.x} ${view.y}) scale(${view.scale})`}>
        {shown.map(({ mark, geometry, isChosen, press }) => (
          <g key={mark.id}>
            <MarkShape geometry={geometry} strong={isChosen} />
            {press && (
              <path
                {...press}
                d={markPath(geometry)}
                fill="none"
                stroke="transparent"
                strokeWidth={14}
                vectorEffect="non-scaling-stroke"
              />
            )}
          </g>
        ))}
        {drawn.shape && <MarkShape geometry={drawn.shape} strong />}
        {!drawn.shape && drawn.points.length > 1 && (
          <path
            d={`M${drawn.points.map(([x, y]) => `${x} ${y}`).join("L")}`}
            fill="none"
            stroke="#fff"
            strokeWidth={1.8}
            strokeDasharray="4 3"
            vectorEffect="non-scaling-stroke"
          />
        )}
      </g>
      {shown.map(({ mark, geometry, isChosen, press }) => (
        <g key={mark.id} {...press}>
          <MarkPoints geometry={geometry} view={view} />
          <MarkTag
            caption={mark.caption}
            tool={mark.content.tool}
            geometry={geometry}
            view={view}
            strong={isChosen}
          />
        </g>
      ))}
      {drawn.points.map((point, i) => {
        const [x, y] = toScreen(point, view);
        return (
          <rect
            key={i}
            x={x - 4}
            y={y - 4}
            width={8}
            height={8}
            fill="#000"
            stroke="#fff"
            strokeWidth={1.6}
          />
        );
      })}
      {editing &&
        pointsOf(editing.geometry).map((point, i) => (
          <Handle
            key={i}
            at={point}
            view={view}
            isChosen={i === editing.index}
            onChoose={() => onChoosePoint(i)}
            onMove={(to) => onMovePoint(to, i)}
          />
        ))}
      {crossAt && (
        <path
          d={`M${crossAt[0] - 14} ${crossAt[1]}h28M${crossAt[0]} ${crossAt[1] - 14}v28`}
          stroke="#fff"
          strokeWidth={1.6}
          style={{ filter: "drop-shadow(0 0 1px #000)" }}
        />
      )}
    </svg>
  );
}

/** A point that can be dragged: small to see, large to hit. */
function Handle(props: {
  at: Point;
  view: View;
  isChosen: boolean;
  onChoose: () => void;
  onMove: (to: Point) => void;
}) {
  const [x, y] = toScreen(props.at, props.view);
  return (
    <g
      className="pointer-events-auto cursor-move"
      onPointerDown={(event) => {
        event.stopPropagation();
        event.currentTarget.setPointerCapture(event.pointerId);
        props.onChoose();
      }}
      onPointerMove={(event) => {
        if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
        const box = event.currentTarget.ownerSVGElement?.getBoundingClientRect();
        if (!box) return;
        props.onMove(toPicture([event.clientX - box.left, event.clientY - box.top], props.view));
      }}
    >
      <circle cx={x} cy={y} r={12} fill="transparent" className="pointer-coarse:[r:22px]" />
      <rect
        x={x - 5}
        y={y - 5}
        width={10}
        height={10}
        fill={props.isChosen ? "#fff" : "#000"}
        stroke={props.isChosen ? "#000" : "#fff"}
        strokeWidth={1.6}
      />
    </g>
  );
}
