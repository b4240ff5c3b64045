"use client";

import { useCallback, useEffect, useState } from "react";
import type { BenchState } from "@/lib/images/bench-state";
import { routes } from "@/lib/routes";

const LOOK_EVERY_MS = 2_000;

/** What is on the picture now; another person's marks appear within two seconds. */
export function useBenchState(imageId: string, first: BenchState) {
  const [state, setState] = useState(first);
  const [isStale, setStale] = useState(false);

  const look = useCallback(
    async (isBackground: boolean) => {
      try {
        const answer = await fetch(routes.api.marks(imageId), {
          cache: "no-store",
          headers: isBackground ? { "x-riverline-background": "1" } : {},
        });
        if (!answer.ok) throw new Error(`status ${answer.status}`);
        const next: BenchState = await answer.json();
        setState((now) => (JSON.stringify(now) === JSON.stringify(next) ? now : next));
        setStale(false);
      } catch {
        // The picture stays as last seen; the bar says that it may be old.
        setStale(true);
      }
    },
    [imageId],
  );

  useEffect(() => {
    const timer = setInterval(() => {
      if (document.visibilityState === "visible") void look(true);
    }, LOOK_EVERY_MS);
    return () => clearInterval(timer);
  }, [look]);

  return { state, isStale, refresh: useCallback(() => look(false), [look]) };
}
