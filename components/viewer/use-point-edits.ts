"use client";

import { useState } from "react";
import type { Conflict } from "@/lib/errors";
import type { BenchMark } from "@/lib/images/bench-state";
import { type Geometry, markContent, pointsOf } from "@/lib/images/mark-schemas";
import type { Point } from "@/lib/imaging/point";
import type { BenchActs } from "./bench-acts";
import { withoutPoint, withPointAfter, withPointMoved } from "./drawing";
import { findMark, isSameShape } from "./find-mark";
import { changeOf } from "./use-marks";
import type { Server } from "./use-server";
import { ontoPicture } from "./view";

/** A mark whose points are being moved: as it was when that began, and as it is drawn now. */
export type Editing = { mark: BenchMark; geometry: Geometry; index: number };
export type Clash = { conflict: Conflict; editing: Editing };

type Given = {
  imageId: string;
  size: { widthPx: number; heightPx: number };
  acts: BenchActs;
  server: Server;
  refresh: () => Promise<void>;
  onMoved: (mark: BenchMark, to: Geometry) => void;
};

/** Moving, adding and taking out the points of one mark, and what happens when two people do. */
export function usePointEdits({ imageId, size, acts, server, refresh, onMoved }: Given) {
  const [editing, setEditing] = useState<Editing | null>(null);
  const [clash, setClash] = useState<Clash | null>(null);
  const count = editing ? pointsOf(editing.geometry).length : 0;

  const change = (next: (now: Editing) => Partial<Editing> | null) =>
    setEditing((now) => now && { ...now, ...next(now) });

  async function save(given: Editing): Promise<void> {
    const answer = await server.ask(() => acts.change(changeOf(given.mark, given.geometry)));
    if (answer.ok) {
      onMoved(given.mark, given.geometry);
      setEditing(null);
      await refresh();
      return;
    }
    const { conflict } = answer.error;
    if (!conflict) return;
    const theirs = markContent.safeParse(conflict.theirs);
    // Values worked out anew, or another name, do not stand against new points.
    const isOnlyWords =
      theirs.success && isSameShape(theirs.data.geometry, given.mark.content.geometry);
    if (isOnlyWords) await saveOverNewest(given);
    else setClash({ conflict, editing: given });
  }

  async function saveOverNewest(given: Editing): Promise<void> {
    const answer = await server.ask(async () => {
      const found = await findMark(imageId, given.mark.id);
      if (found && !found.isDeleted) return { ok: true, value: found.mark };
      const message = `${given.mark.label} was deleted in the meantime. Restore it first.`;
      return { ok: false, error: { code: "LOCKED", message } };
    });
    if (answer.ok) await save({ ...given, mark: answer.value });
    else await refresh();
  }

  return {
    editing,
    clash,
    start: (mark: BenchMark) => setEditing({ mark, geometry: mark.content.geometry, index: 0 }),
    giveUp: () => setEditing(null),
    save: async () => {
      if (editing && !server.isBusy) await save(editing);
    },
    movePoint: (to: Point, index?: number) =>
      change(({ geometry, index: chosen }) => {
        const at = index ?? chosen;
        return { index: at, geometry: withPointMoved(geometry, at, ontoPicture(to, size)) };
      }),
    stepPoint: ([x, y]: Point) =>
      change(({ geometry, index }) => {
        const from = pointsOf(geometry)[index];
        if (!from) return null;
        const to = ontoPicture([from[0] + x, from[1] + y], size);
        return { geometry: withPointMoved(geometry, index, to) };
      }),
    choosePoint: (index: number) => change(() => ({ index: (index + count) % count })),
    addPoint: () =>
      change(({ geometry, index }) => {
        const more = withPointAfter(geometry, index);
        return more && { geometry: more, index: index + 1 };
      }),
    takeOutPoint: () =>
      change(({ geometry, index }) => {
        const fewer = withoutPoint(geometry, index);
        return fewer && { geometry: fewer, index: Math.min(index, pointsOf(fewer).length - 1) };
      }),
    /** Mine becomes the newest version; theirs stays beneath it, and Undo brings it back. */
    keepMine: async () => {
      if (!clash) return;
      setClash(null);
      await saveOverNewest(clash.editing);
    },
    chooseLater: () => setClash(null),
    takeTheirs: async () => {
      setClash(null);
      setEditing(null);
      await refresh();
    },
  };
}
export type PointEdits = ReturnType<typeof usePointEdits>;
