import "server-only";

/** Waits `ms`, or until `signal` says stop. */
export function pause(ms: number, signal: AbortSignal): Promise<void> {
  // A signal that came while the queue was asked fires no event any more.
  if (signal.aborted) return Promise.resolve();
  return new Promise((resolve) => {
    const end = () => {
      clearTimeout(timer);
      // A worker pauses for as long as it lives; each listener left behind would stay with it.
      signal.removeEventListener("abort", end);
      resolve();
    };
    const timer = setTimeout(end, ms);
    signal.addEventListener("abort", end);
  });
}
