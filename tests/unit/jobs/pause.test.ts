import { getEventListeners } from "node:events";
import { describe, expect, it } from "vitest";
import { pause } from "@/lib/jobs/pause";

const listenersOf = (signal: AbortSignal) => getEventListeners(signal, "abort").length;

describe("the pause of a worker", () => {
  it("leaves nothing behind on the signal when its time is up", async () => {
    const { signal } = new AbortController();
    for (let i = 0; i < 20; i += 1) await pause(1, signal);
    expect(listenersOf(signal)).toBe(0);
  });

  it("ends at once when the signal says stop, and leaves nothing behind", async () => {
    const stop = new AbortController();
    const begun = performance.now();
    const waiting = pause(60_000, stop.signal);
    expect(listenersOf(stop.signal)).toBe(1);
    stop.abort();
    await waiting;
    expect(performance.now() - begun).toBeLessThan(10_000);
    expect(listenersOf(stop.signal)).toBe(0);
    await pause(60_000, stop.signal);
    expect(performance.now() - begun).toBeLessThan(10_000);
  });
});
