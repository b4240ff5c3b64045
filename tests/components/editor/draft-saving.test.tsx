import { act, cleanup, renderHook } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { readFromDevice } from "@/components/forms/device-copy";
import { newestDraft, useDraftSaving } from "@/components/forms/use-draft-saving";

type Draft = { document: string; rootCause: string };
type Answer = { status: number; body: unknown } | "no connection";

const KEY = "riverline.findings.case_1.1";
let answers: Answer[];
let sent: { revision: number; document: string }[];

beforeEach(() => {
  vi.useFakeTimers();
  localStorage.clear();
  answers = [];
  sent = [];
  vi.stubGlobal("fetch", (_url: string, init: { body: string }) => {
    sent.push(JSON.parse(init.body));
    const answer = answers.shift() ?? "no connection";
    return answer === "no connection"
      ? Promise.reject(new TypeError("Failed to fetch"))
      : Promise.resolve(Response.json(answer.body, { status: answer.status }));
  });
});
afterEach(() => {
  cleanup();
  vi.useRealTimers();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

const saved = (revision: number): Answer => ({
  status: 200,
  body: { revision, savedAt: "2026-12-01T11:31:00Z" },
});
const conflict = (revision: number): Answer => ({
  status: 409,
  body: {
    error: {
      conflict: {
        yours: { document: "mine", rootCause: "" },
        theirs: { document: "theirs", rootCause: "", revision },
        changedBy: "Tove Brandt",
        changedAt: "2026-12-01T11:40:00Z",
      },
    },
  },
});

function open() {
  let document = "";
  // A text taken over from elsewhere brings the revision of that place along.
  const read = () => ({ document, rootCause: "", revision: 99, at: "never" });
  const { result } = renderHook(() =>
    useDraftSaving<Draft, { revision: number; savedAt: string }>({
      url: "/save",
      storageKey: KEY,
      revision: 1,
      savedAt: null,
      read,
    }),
  );
  return {
    state: () => result.current.state.kind,
    hook: () => result.current,
    type: (text: string) =>
      act(() => {
        document = text;
        result.current.changed();
      }),
  };
}
const pass = (ms: number) => act(() => vi.advanceTimersByTimeAsync(ms));

describe("saving as one types", () => {
  test("waits 1.5 s after the last key, sends once, and forgets the copy once the server has it", async () => {
    answers = [saved(2)];
    const page = open();
    page.type("It");
    await pass(1_000);
    page.type("It broke");
    expect(readFromDevice(KEY)).toMatchObject({ revision: 1, draft: { document: "It broke" } });
    await pass(1_400);
    expect(sent).toEqual([]);
    await pass(200);
    expect(sent).toMatchObject([{ revision: 1, document: "It broke" }]);
    expect(page.state()).toBe("saved");
    expect(readFromDevice(KEY)).toBeNull();
  });

  test("goes on without a connection, and sends the newest text when it is back", async () => {
    answers = ["no connection", "no connection", saved(2)];
    const page = open();
    page.type("one");
    await pass(1_600);
    expect(page.state()).toBe("offline");
    page.type("one two");
    await pass(1_600);
    expect(page.state()).toBe("offline");
    expect(readFromDevice(KEY)).toMatchObject({ draft: { document: "one two" } });
    await pass(5_100);
    expect(page.state()).toBe("saved");
    expect(sent.at(-1)).toMatchObject({ revision: 1, document: "one two" });
  });

  test("sends at once when the browser is online again", async () => {
    answers = ["no connection", saved(2)];
    const page = open();
    page.type("one");
    await pass(1_600);
    act(() => void window.dispatchEvent(new Event("online")));
    await pass(1);
    expect(page.state()).toBe("saved");
  });

  test("keeps the copy when the sign-in has ended", async () => {
    answers = [
      { status: 401, body: { error: { code: "NOT_SIGNED_IN", message: "You are signed out." } } },
    ];
    const page = open();
    page.type("one");
    await pass(1_600);
    expect(page.state()).toBe("signed-out");
    expect(readFromDevice(KEY)).toMatchObject({ draft: { document: "one" } });
  });

  test("saves by itself when one comes back from signing in", async () => {
    answers = [{ status: 401, body: { error: { code: "NOT_SIGNED_IN", message: "" } } }, saved(2)];
    const page = open();
    page.type("one");
    await pass(1_600);
    act(() => void window.dispatchEvent(new Event("focus")));
    await pass(1);
    expect(page.state()).toBe("saved");
    expect(sent).toMatchObject([{ document: "one" }, { document: "one" }]);
  });

  test("sends what was refused again when asked, without another key", async () => {
    answers = [
      { status: 400, body: { error: { code: "INVALID", message: "A figure is not from here." } } },
      saved(2),
    ];
    const page = open();
    page.type("one");
    await pass(1_600);
    expect(page.state()).toBe("refused");
    await expect(act(() => page.hook().saveNow())).resolves.toBe(true);
    expect(sent.at(-1)).toMatchObject({ revision: 1, document: "one" });
  });

  test("does not take an answer that is not the portal's for a saved text", async () => {
    vi.stubGlobal("fetch", () => Promise.resolve(new Response("<h1>Bad gateway</h1>")));
    const page = open();
    page.type("one");
    await pass(1_600);
    expect(page.state()).toBe("offline");
    expect(readFromDevice(KEY)).toMatchObject({ draft: { document: "one" } });
  });

  test("a page that comes back older from the browser's history starts from what was saved since", async () => {
    answers = [saved(2)];
    const page = open();
    page.type("one two");
    await pass(1_600);
    const parse = (kept: unknown) =>
      typeof kept === "object" && kept !== null && "document" in kept
        ? { document: String(kept.document), rootCause: "" }
        : null;
    const old = { revision: 1, savedAt: null, draft: { document: "one", rootCause: "" } };
    expect(newestDraft(KEY, old, parse)).toMatchObject({
      revision: 2,
      draft: { document: "one two" },
    });
    const newer = { ...old, revision: 3 };
    expect(newestDraft(KEY, newer, parse)).toBe(newer);
    expect(newestDraft("riverline.another", old, parse)).toBe(old);
  });

  test("sends what was typed last when one goes on to another page", async () => {
    answers = [saved(2)];
    const page = open();
    page.type("one");
    cleanup();
    await pass(1);
    expect(sent).toMatchObject([{ revision: 1, document: "one" }]);
  });

  test("after a conflict keeps mine over theirs only when asked to", async () => {
    answers = [conflict(5), saved(6)];
    const page = open();
    page.type("mine");
    await pass(1_600);
    expect(page.state()).toBe("conflict");
    await pass(20_000);
    expect(sent).toHaveLength(1);
    act(() => page.hook().overrule(5));
    await pass(1);
    expect(sent.at(-1)).toMatchObject({ revision: 5, document: "mine" });
    expect(page.state()).toBe("saved");
  });

  test("after taking theirs goes on from it, through a lost connection as well", async () => {
    answers = [conflict(5), saved(6), "no connection", saved(7)];
    const page = open();
    page.type("mine");
    await pass(1_600);
    act(() => page.hook().yieldTo(5));
    expect(page.state()).toBe("saved");
    page.type("theirs and more");
    await pass(1_600);
    page.type("theirs and more still");
    await pass(1_600);
    act(() => void window.dispatchEvent(new Event("online")));
    await pass(1);
    expect(sent.map(({ revision }) => revision)).toEqual([1, 5, 6, 6]);
    expect(page.state()).toBe("saved");
  });

  test("goes on saving where the browser keeps no copy, and says so", async () => {
    const full = vi.spyOn(Storage.prototype, "setItem").mockImplementation(() => {
      throw new DOMException("exceeded the quota", "QuotaExceededError");
    });
    answers = ["no connection", saved(2), saved(3)];
    const page = open();
    expect(page.hook().keepsCopy).toBe(true);
    page.type("one");
    expect(page.hook().keepsCopy).toBe(false);
    await pass(1_600);
    expect(page.state()).toBe("offline");
    await pass(5_100);
    expect(page.state()).toBe("saved");
    full.mockRestore();
    page.type("one two");
    expect(page.hook().keepsCopy).toBe(true);
  });

  test("goes on saving where storage is forbidden altogether", async () => {
    for (const name of ["setItem", "getItem", "removeItem"] as const)
      vi.spyOn(Storage.prototype, name).mockImplementation(() => {
        throw new DOMException("The operation is insecure.", "SecurityError");
      });
    answers = [saved(2)];
    const page = open();
    page.type("one");
    await pass(1_600);
    expect(page.state()).toBe("saved");
    expect(page.hook().keepsCopy).toBe(false);
  });
});
