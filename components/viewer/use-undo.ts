"use client";

import { useCallback, useRef, useState } from "react";

/**
 * How a step back or forth ended: it worked; it failed and may be tried again; or it can no longer
 * be done, because somebody else changed the same thing, and is forgotten.
 */
export type StepEnd = "worked" | "failed" | "gone";

/** One act that can be taken back and done again. */
export type Undoable = {
  undo: () => Promise<StepEnd>;
  redo: () => Promise<StepEnd>;
};

/** Acts of this sitting, without limit. */
export function useUndo() {
  const [done, setDone] = useState<Undoable[]>([]);
  const [undone, setUndone] = useState<Undoable[]>([]);
  const [isBusy, setBusy] = useState(false);
  // Two quick keys come before the next drawing of the page; the second must find the first at work.
  const isAtWork = useRef(false);

  const did = useCallback((act: Undoable) => {
    setDone((acts) => [...acts, act]);
    setUndone([]);
  }, []);

  async function step(way: "undo" | "redo"): Promise<void> {
    const act = (way === "undo" ? done : undone).at(-1);
    if (!act || isAtWork.current) return;
    isAtWork.current = true;
    setBusy(true);
    try {
      const end = await act[way]();
      if (end === "failed") return;
      const [take, give] = way === "undo" ? [setDone, setUndone] : [setUndone, setDone];
      take((acts) => acts.filter((one) => one !== act));
      if (end === "worked") give((acts) => [...acts, act]);
    } finally {
      isAtWork.current = false;
      setBusy(false);
    }
  }

  return {
    did,
    canUndo: done.length > 0 && !isBusy,
    canRedo: undone.length > 0 && !isBusy,
    undo: () => step("undo"),
    redo: () => step("redo"),
  };
}
