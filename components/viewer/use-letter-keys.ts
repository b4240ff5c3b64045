"use client";

import { useCallback, useSyncExternalStore } from "react";

const KEY = "riverline.bench.letters";
const CHANGED = "riverline-letters";

function subscribe(tell: () => void): () => void {
  window.addEventListener(CHANGED, tell);
  return () => window.removeEventListener(CHANGED, tell);
}

/** Whether single letters take up tools; people who speak to their computer turn it off. */
export function useLetterKeys(): [boolean, (on: boolean) => void] {
  const isOn = useSyncExternalStore(
    subscribe,
    () => localStorage.getItem(KEY) !== "off",
    () => true,
  );
  const set = useCallback((on: boolean) => {
    localStorage.setItem(KEY, on ? "on" : "off");
    window.dispatchEvent(new Event(CHANGED));
  }, []);
  return [isOn, set];
}
