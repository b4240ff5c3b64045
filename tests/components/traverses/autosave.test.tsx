import { act, cleanup, renderHook } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { readDraft } from "@/components/traverses/kept-draft";
import { type SaveAnswer, useAutosave } from "@/components/traverses/use-autosave";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { content, saved } from "./open-station";

const refresh = vi.fn();
vi.mock("next/navigation", () => ({ useRouter: () => ({ refresh }) }));

type Save = (seenVersion: number, content: TraverseContent) => Promise<SaveAnswer>;
const FIRST = content();
const named = (name: string) => content({ name });

beforeEach(() => {
  vi.useFakeTimers();
  localStorage.clear();
  refresh.mockClear();
});
afterEach(() => {
  cleanup();
  vi.useRealTimers();
  vi.restoreAllMocks();
});

function open(save: Save, isReadOnly = false) {
  const { result, rerender, unmount } = renderHook(
    (now: { content: TraverseContent; version: number }) =>
      useAutosave({
        traverseId: "rec_t2",
        savedAt: "2026-12-01T09:00:00Z",
        save,
        isReadOnly,
        ...now,
      }),
    { initialProps: { content: FIRST, version: 4 } },
  );
  return {
    state: () => result.current.state,
    hook: () => result.current,
    type: (next: TraverseContent, version = 4) => rerender({ content: next, version }),
    wait: (ms: number) => act(() => vi.advanceTimersByTimeAsync(ms)),
    leave: unmount,
  };
}

const conflict = (theirs: TraverseContent): SaveAnswer => ({
  ok: false,
  error: {
    code: "CONFLICT",
    message: "Sanna Reeve changed T2 meanwhile.",
    conflict: {
      yours: named("mine"),
      theirs,
      changedBy: "Sanna Reeve",
      changedAt: "2026-12-01T10:00:00Z",
    },
  },
});

describe("a traverse that is being typed", () => {
  test("is saved once the typing rests, with the version that was seen", async () => {
    const save = vi.fn<Save>((seen) => Promise.resolve(saved(seen + 1)));
    const station = open(save);
    station.type(named("a"));
    expect(station.state().kind).toBe("unsaved");
    await station.wait(1000);
    station.type(named("ab"));
    await station.wait(1000);
    expect(save).not.toHaveBeenCalled();
    await station.wait(600);
    expect(save.mock.calls).toEqual([[4, named("ab")]]);
    expect(station.state().kind).toBe("saved");
    expect(readDraft("rec_t2")).toBeNull();
    station.type(named("abc"));
    await station.wait(1600);
    expect(save.mock.calls[1]).toEqual([5, named("abc")]);
  });

  test("is kept on the device while nothing answers, and sent when it does", async () => {
    let answers = false;
    const save = vi.fn<Save>((seen) =>
      answers ? Promise.resolve(saved(seen + 1)) : Promise.reject(new TypeError("Failed to fetch")),
    );
    const station = open(save);
    station.type(named("offline"));
    await station.wait(1600);
    expect(station.state().kind).toBe("offline");
    expect(readDraft("rec_t2")?.content).toEqual(named("offline"));
    answers = true;
    await station.wait(5100);
    expect(station.state().kind).toBe("saved");
    expect(readDraft("rec_t2")).toBeNull();
  });

  test("is kept on the device when the page is left before it was saved", () => {
    const save = vi.fn<Save>((seen) => Promise.resolve(saved(seen + 1)));
    const station = open(save);
    station.type(named("left"));
    station.leave();
    expect(save).not.toHaveBeenCalled();
    expect(readDraft("rec_t2")).toMatchObject({ seenVersion: 4, content: named("left") });
  });

  test("says when the browser keeps no copy, and is saved all the same", async () => {
    vi.spyOn(Storage.prototype, "setItem").mockImplementation(() => {
      throw new DOMException("full", "QuotaExceededError");
    });
    const save = vi.fn<Save>((seen) => Promise.resolve(saved(seen + 1)));
    const station = open(save);
    station.type(named("full"));
    await station.wait(1600);
    expect(station.hook().keepsCopy).toBe(false);
    expect(station.state().kind).toBe("saved");
  });

  test("that the server refuses stays unsaved with the reason, until it is tried again", async () => {
    const save = vi
      .fn<Save>()
      .mockResolvedValueOnce({
        ok: false,
        error: { code: "INVALID", message: "Not saved.", fields: { "content.name": "Say where." } },
      })
      .mockResolvedValue(saved(5));
    const station = open(save);
    station.type(named(""));
    await station.wait(1600);
    expect(station.state()).toMatchObject({
      kind: "failed",
      fields: { "content.name": "Say where." },
    });
    await act(() => Promise.resolve(station.hook().retry()));
    expect(station.state().kind).toBe("saved");
  });

  test("is never sent by whoever may only read", async () => {
    const save = vi.fn<Save>();
    const station = open(save, true);
    station.type(named("read"));
    await station.wait(10_000);
    expect(save).not.toHaveBeenCalled();
  });
});

describe("two people at one traverse", () => {
  test("the second is shown the other's rows and nothing is sent until they choose", async () => {
    const save = vi.fn<Save>().mockResolvedValueOnce(conflict(named("theirs")));
    const station = open(save);
    station.type(named("mine"));
    await station.wait(1600);
    expect(station.state()).toMatchObject({
      kind: "conflict",
      message: "Sanna Reeve changed T2 meanwhile.",
      theirs: { content: { name: "theirs" }, by: "Sanna Reeve" },
    });
    expect(readDraft("rec_t2")?.content).toEqual(named("mine"));
    // Brings the number of the version that now stands.
    expect(refresh).toHaveBeenCalledOnce();
    await station.wait(60_000);
    expect(save).toHaveBeenCalledOnce();
  });

  test("one's own rows can be saved over the other's version", async () => {
    const save = vi
      .fn<Save>()
      .mockResolvedValueOnce(conflict(named("theirs")))
      .mockResolvedValue(saved(6));
    const station = open(save);
    station.type(named("mine"));
    await station.wait(1600);
    station.type(named("mine"), 5);
    await act(() => Promise.resolve(station.hook().keepMine()));
    expect(save.mock.calls[1]).toEqual([5, named("mine")]);
    expect(station.state().kind).toBe("saved");
  });

  test("the other's can be taken, and one's own copy goes", async () => {
    const save = vi.fn<Save>().mockResolvedValueOnce(conflict(named("theirs")));
    const station = open(save);
    station.type(named("mine"));
    await station.wait(1600);
    act(() => station.hook().takeTheirs());
    expect(readDraft("rec_t2")).toBeNull();
  });
});
