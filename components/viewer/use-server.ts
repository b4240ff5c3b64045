"use client";

import { useCallback, useState } from "react";
import type { BenchAnswer } from "./bench-acts";

const NO_ANSWER =
  "There was no answer, so it is not known whether it was saved. Look at the marks, then try again.";

/** Asks the server one thing at a time, and holds what it refused until the next is asked. */
export function useServer() {
  const [error, setError] = useState<string | null>(null);
  const [isBusy, setBusy] = useState(false);

  const ask = useCallback(
    async <T>(work: () => Promise<BenchAnswer<T>>): Promise<BenchAnswer<T>> => {
      setBusy(true);
      setError(null);
      try {
        const answer = await work();
        if (!answer.ok && !answer.error.conflict) {
          setError(Object.values(answer.error.fields ?? {})[0] ?? answer.error.message);
        }
        return answer;
      } catch {
        setError(NO_ANSWER);
        return { ok: false, error: { code: "NO_ANSWER", message: NO_ANSWER } };
      } finally {
        setBusy(false);
      }
    },
    [],
  );

  return { error, isBusy, ask, tell: setError };
}
export type Server = ReturnType<typeof useServer>;
