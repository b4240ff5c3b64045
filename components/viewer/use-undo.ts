"use client";

import { useCallback, useState } from "react";

/** One act that can be taken back and done again. Each returns whether it worked. */
export type Undoable = {
  words: string;
  undo: () => Promise<boolean>;
  redo: () => Promise<boolean>;
};

/** Acts of this sitting, without limit. */
export function useUndo() {
  const [done, setDone] = useState<Undoable[]>([]);
  const [undone, setUndone] = useState<Undoable[]>([]);
  const [isBusy, setBusy] = useState(false);

  const did = useCallback((act: Undoable) => {
    setDone((acts) => [...acts, act]);
    setUndone([]);
  }, []);

  const step = useCallback(
    async (
      from: Undoable[],
      run: (act: Undoable) => Promise<boolean>,
      move: (act: Undoable) => void,
    ) => {
      const act = from.at(-1);
      if (!act || isBusy) return;
      setBusy(true);
      if (await run(act)) move(act);
      setBusy(false);
    },
    [isBusy],
  );

  return {
    did,
    canUndo: done.length > 0 && !isBusy,
    canRedo: undone.length > 0 && !isBusy,
    undo: () =>
      step(
        done,
        (act) => act.undo(),
        (act) => {
          setDone((acts) => acts.slice(0, -1));
          setUndone((acts) => [...acts, act]);
        },
      ),
    redo: () =>
      step(
        undone,
        (act) => act.redo(),
        (act) => {
          setUndone((acts) => acts.slice(0, -1));
          setDone((acts) => [...acts, act]);
        },
      ),
  };
}
