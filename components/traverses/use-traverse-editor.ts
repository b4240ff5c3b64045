"use client";

import { useCallback, useReducer } from "react";
import type { TraverseContent } from "@/lib/traverses/schemas";

const STEPS_KEPT = 100;

type State = {
  content: TraverseContent;
  past: readonly TraverseContent[];
  /** Changes to one cell in a row are one step of undo. */
  lastStep: string | null;
};
type Change =
  | { kind: "change"; step: string | null; make: (content: TraverseContent) => TraverseContent }
  | { kind: "replace"; content: TraverseContent }
  | { kind: "undo" };

function reduce(state: State, change: Change): State {
  switch (change.kind) {
    case "change": {
      const content = change.make(state.content);
      if (content === state.content) return state;
      const isSameStep = change.step !== null && change.step === state.lastStep;
      return {
        content,
        past: isSameStep ? state.past : [...state.past, state.content].slice(-STEPS_KEPT),
        lastStep: change.step,
      };
    }
    case "replace":
      return { content: change.content, past: [], lastStep: null };
    case "undo": {
      const before = state.past.at(-1);
      return before ? { content: before, past: state.past.slice(0, -1), lastStep: null } : state;
    }
  }
}

/** A traverse as it is being typed, with undo. */
export function useTraverseEditor(initial: TraverseContent) {
  const [state, send] = useReducer(reduce, { content: initial, past: [], lastStep: null });
  const change = useCallback(
    (make: (content: TraverseContent) => TraverseContent, step: string | null = null) =>
      send({ kind: "change", step, make }),
    [],
  );
  return {
    content: state.content,
    canUndo: state.past.length > 0,
    /** `step` names the cell or field: typing on in the same one is one step of undo. */
    change,
    replace: (content: TraverseContent) => send({ kind: "replace", content }),
    undo: () => send({ kind: "undo" }),
  };
}
export type TraverseEditor = ReturnType<typeof useTraverseEditor>;
