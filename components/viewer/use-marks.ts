"use client";

import type { BenchMark } from "@/lib/images/bench-state";
import type { Geometry } from "@/lib/images/mark-schemas";
import type { BenchActs } from "./bench-acts";
import type { MarkWords } from "./draw-panel";
import { findMark, isSameShape } from "./find-mark";
import type { Server } from "./use-server";
import { type StepEnd, useUndo } from "./use-undo";

type Given = {
  imageId: string;
  acts: BenchActs;
  server: Server;
  refresh: () => Promise<void>;
  say: (words: string) => void;
};

/**
 * Placing, deleting and moving marks, each of which can be undone. A step back is taken only where
 * the mark is still as this person left it, so that nobody's later work is undone with it.
 */
export function useMarks({ imageId, acts, server, refresh, say }: Given) {
  const history = useUndo();

  /** Does `work` with the mark as it is now, if it is still in place with these points. */
  async function ifUnchanged(
    { id, label }: Pick<BenchMark, "id" | "label">,
    left: Geometry,
    work: (now: BenchMark) => ReturnType<BenchActs["remove"]>,
  ): Promise<StepEnd> {
    let isGone = false;
    const answer = await server.ask(async () => {
      const found = await findMark(imageId, id);
      const mark = found && !found.isDeleted ? found.mark : null;
      if (mark && isSameShape(mark.content.geometry, left)) return work(mark);
      isGone = true;
      const why = mark ? `${mark.by} has moved it since` : "somebody has deleted it since";
      return {
        ok: false,
        error: { code: "CONFLICT", message: `${label} was left as it is: ${why}.` },
      };
    });
    await refresh();
    return answer.ok ? "worked" : isGone ? "gone" : "failed";
  }

  const takeOff = (mark: Pick<BenchMark, "id" | "label">, left: Geometry) =>
    ifUnchanged(mark, left, (now) => acts.remove({ markId: mark.id, seenVersion: now.number }));

  async function putBack({ id }: Pick<BenchMark, "id">): Promise<StepEnd> {
    const answer = await server.ask(() => acts.restore({ markId: id }));
    await refresh();
    if (answer.ok) return "worked";
    return answer.error.code === "CONFLICT" ? "gone" : "failed";
  }

  const reshape = (mark: BenchMark, from: Geometry, to: Geometry) =>
    ifUnchanged(mark, from, (now) => acts.change(changeOf(now, to)));

  /** @returns the new mark's id, or null when it was not saved */
  async function place(geometry: Geometry, words: MarkWords): Promise<string | null> {
    const answer = await server.ask(() => acts.place({ imageId, geometry, ...words }));
    if (!answer.ok) return null;
    const { recordId: id, label } = answer.value;
    const mark = { id, label };
    history.did({ undo: () => takeOff(mark, geometry), redo: () => putBack(mark) });
    say(`${label} placed`);
    await refresh();
    return id;
  }

  /** Deletes a mark as this person sees it; one that changed in the meantime stays. */
  async function remove(mark: BenchMark): Promise<boolean> {
    const answer = await server.ask(() =>
      acts.remove({ markId: mark.id, seenVersion: mark.number }),
    );
    await refresh();
    if (!answer.ok) {
      if (answer.error.conflict) server.tell(answer.error.message);
      return false;
    }
    const left = mark.content.geometry;
    history.did({ undo: () => putBack(mark), redo: () => takeOff(mark, left) });
    say(`${mark.label} deleted`);
    return true;
  }

  async function restore(mark: BenchMark): Promise<void> {
    if ((await putBack(mark)) !== "worked") return;
    const left = mark.content.geometry;
    history.did({ undo: () => takeOff(mark, left), redo: () => putBack(mark) });
    say(`${mark.label} restored`);
  }

  /** Keeps in the history that `mark` had other points before. */
  function moved(mark: BenchMark, to: Geometry): void {
    const from = mark.content.geometry;
    history.did({ undo: () => reshape(mark, to, from), redo: () => reshape(mark, from, to) });
    say(`${mark.label} saved`);
  }

  return { history, place, remove, restore, moved };
}

/** The change that gives a mark other points and leaves all else of it. */
export function changeOf({ id, number, content }: BenchMark, geometry: Geometry) {
  const { featureCode, name, confidence, note, originId } = content;
  return {
    markId: id,
    seenVersion: number,
    geometry,
    featureCode,
    name,
    confidence,
    note,
    originId,
  };
}
