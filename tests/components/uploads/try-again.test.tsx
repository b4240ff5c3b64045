import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { NoAnswer, Refused } from "@/components/uploads/ask-server";
import { tryAgain } from "@/components/uploads/try-again";

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

test("what did not answer is tried again with growing pauses, until it answers", async () => {
  const at: number[] = [];
  const begun = Date.now();
  const work = () => {
    at.push(Date.now() - begun);
    return at.length < 4 ? Promise.reject(new NoAnswer("no")) : Promise.resolve("there");
  };
  const ended = tryAgain(new AbortController().signal, work);
  await vi.runAllTimersAsync();
  await expect(ended).resolves.toBe("there");
  expect(at).toEqual([0, 500, 1500, 3500]);
});

test("it gives up after the sixth try", async () => {
  const work = vi.fn(() => Promise.reject(new NoAnswer("no")));
  const ended = expect(tryAgain(new AbortController().signal, work)).rejects.toThrow(NoAnswer);
  await vi.runAllTimersAsync();
  await ended;
  expect(work).toHaveBeenCalledTimes(6);
});

test("a refusal is not asked twice", async () => {
  const work = vi.fn(() => Promise.reject(new Refused("never")));
  await expect(tryAgain(new AbortController().signal, work)).rejects.toThrow("never");
  expect(work).toHaveBeenCalledTimes(1);
});

test("pausing ends the wait at once", async () => {
  const stop = new AbortController();
  const work = vi.fn(() => Promise.reject(new NoAnswer("no")));
  const ended = expect(tryAgain(stop.signal, work)).rejects.toThrow("paused");
  await vi.advanceTimersByTimeAsync(100);
  stop.abort(new Error("paused"));
  await ended;
  await vi.runAllTimersAsync();
  expect(work).toHaveBeenCalledTimes(1);
});
