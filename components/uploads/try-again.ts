import { NoAnswer } from "./ask-server";

const PAUSES_MS = [500, 1_000, 2_000, 4_000, 8_000];

function pause(ms: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve, reject) => {
    const stop = () => {
      clearTimeout(timer);
      reject(signal.reason);
    };
    const timer = setTimeout(() => {
      signal.removeEventListener("abort", stop);
      resolve();
    }, ms);
    signal.addEventListener("abort", stop, { once: true });
  });
}

/** Runs `work` until it answers, with growing pauses; gives up after the last, or at a refusal. */
export async function tryAgain<T>(signal: AbortSignal, work: () => Promise<T>): Promise<T> {
  for (let attempt = 0; ; attempt += 1) {
    try {
      return await work();
    } catch (error) {
      const pauseMs = PAUSES_MS[attempt];
      if (!(error instanceof NoAnswer) || pauseMs === undefined) throw error;
      await pause(pauseMs, signal);
    }
  }
}
