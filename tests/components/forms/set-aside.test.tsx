import { act, cleanup, renderHook, waitFor } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { keepOnDevice, readFromDevice } from "@/components/forms/device-copy";
import { useSetAside } from "@/components/forms/use-set-aside";

type Draft = { text: string };
const KEY = "riverline.test";
const ASIDE = `${KEY}.aside`;

beforeEach(() => localStorage.clear());
afterEach(cleanup);

const parse = (kept: unknown): Draft | null =>
  typeof kept === "object" && kept !== null && "text" in kept && typeof kept.text === "string"
    ? { text: kept.text }
    : null;
const open = (stored = "saved") =>
  renderHook(() => useSetAside<Draft>({ storageKey: KEY, parse, stored: { text: stored } })).result;
const kept = (text: string, revision = 3) => ({
  revision,
  at: `2026-12-01T11:${revision}0:00Z`,
  draft: { text },
});

describe("drafts set aside", () => {
  test("what was never saved is shown, and later typing cannot write over it", async () => {
    keepOnDevice(KEY, kept("never saved"));
    const page = open();
    await waitFor(() => expect(page.current.aside).toEqual([kept("never saved")]));
    keepOnDevice(KEY, kept("typed later", 4));
    cleanup();
    const again = open();
    await waitFor(() =>
      expect(again.current.aside.map(({ draft }) => draft.text)).toEqual([
        "never saved",
        "typed later",
      ]),
    );
  });

  test("a copy of what the server has is not worth showing", async () => {
    keepOnDevice(KEY, kept("saved"));
    const page = open("saved");
    await waitFor(() => expect(readFromDevice(KEY)).toBeNull());
    expect(page.current.aside).toEqual([]);
  });

  test("a copy of another form of the page is left alone", async () => {
    keepOnDevice(ASIDE, [{ revision: 1, at: "then", draft: { words: 1 } }, "nonsense"]);
    const page = open();
    await act(() => Promise.resolve());
    expect(page.current.aside).toEqual([]);
    expect(readFromDevice(ASIDE)).toHaveLength(2);
  });

  test("forgetting one leaves the others, also after a reload", async () => {
    keepOnDevice(ASIDE, [kept("one", 1), kept("two", 2)]);
    const page = open();
    await waitFor(() => expect(page.current.aside).toHaveLength(2));
    const [first] = page.current.aside;
    act(() => first && page.current.forget(first));
    cleanup();
    const again = open();
    await waitFor(() => expect(again.current.aside).toEqual([kept("two", 2)]));
  });

  test("putting one back sets the one on screen aside in its place", async () => {
    keepOnDevice(ASIDE, [kept("one", 1)]);
    const page = open();
    await waitFor(() => expect(page.current.aside).toHaveLength(1));
    const [first] = page.current.aside;
    act(() => page.current.add({ text: "on screen" }, 5, first));
    expect(page.current.aside).toMatchObject([{ revision: 5, draft: { text: "on screen" } }]);
    expect(readFromDevice(ASIDE)).toMatchObject([{ draft: { text: "on screen" } }]);
  });
});
