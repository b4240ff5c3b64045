"use client";

import { useEffect, useEffectEvent } from "react";
import { type BenchKey, readKey } from "./bench-keys";

const isTyping = (target: EventTarget | null) =>
  target instanceof HTMLElement && target.matches("input:not([type=checkbox]), textarea, select");

/** Keys that a button, a link or a box in focus answers itself. */
const ownKeys = (event: KeyboardEvent) =>
  event.key === "Enter" &&
  event.target instanceof HTMLElement &&
  event.target.matches("button, a, summary, input");

/** Hands each key that means something on the bench to `act`, which answers whether it used it. */
export function useBenchKeys(given: {
  letters: boolean;
  isOff: boolean;
  act: (key: BenchKey) => boolean;
}): void {
  const listen = useEffectEvent((event: KeyboardEvent) => {
    if (given.isOff || isTyping(event.target) || ownKeys(event)) return;
    const key = readKey(event, given.letters);
    // A key that is held down moves things on, and does nothing else twice.
    if (!key || (event.repeat && key.does === "set")) return;
    if (given.act(key)) event.preventDefault();
  });
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => listen(event);
    window.addEventListener("keydown", onKeyDown);
    return () => window.removeEventListener("keydown", onKeyDown);
  }, []);
}
