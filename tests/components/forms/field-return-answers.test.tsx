import { act, cleanup, renderHook, waitFor } from "@testing-library/react";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { useAnswers } from "@/app/(portal)/cases/[caseId]/field-return/_components/use-answers";
import { keepOnDevice, readFromDevice } from "@/components/forms/device-copy";
import type { Answers } from "@/lib/intake/answers";
import type { FieldReturnPage } from "@/lib/intake/read-field-return";

const heat = (value: string): Answers => ({ heatNumber: { kind: "value", value } });
/** Each test has a case of its own: what a window saved, it remembers. */
const aPage = (caseId: string): FieldReturnPage => ({
  caseId,
  number: null,
  state: "draft",
  client: "Harrow Bay Lifting Gear",
  answers: heat("7K3392"),
  revision: 5,
  savedAt: "2026-12-01T11:00:00Z",
  mayEdit: true,
  mayAddFiles: null,
  mayAnswer: false,
  files: [],
  questions: [],
  earlier: [],
});
const keyOf = (caseId: string) => `riverline.field-return.${caseId}`;

let sent: { revision: number; answers: Answers }[];
beforeEach(() => {
  localStorage.clear();
  sent = [];
  let stored = { revision: 5, answers: heat("7K3392") };
  vi.stubGlobal("fetch", (_url: string, init: { body: string }) => {
    const draft: { revision: number; answers: Answers } = JSON.parse(init.body);
    sent.push(draft);
    if (draft.revision !== stored.revision) {
      const conflict = {
        yours: { answers: draft.answers },
        theirs: stored,
        changedBy: "Pell Harrow",
        changedAt: "2026-12-01T11:40:00Z",
      };
      return Promise.resolve(Response.json({ error: { conflict } }, { status: 409 }));
    }
    stored = { revision: draft.revision + 1, answers: draft.answers };
    return Promise.resolve(Response.json({ revision: stored.revision, savedAt: "now" }));
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

async function openWithKept(caseId: string, revision: number) {
  keepOnDevice(keyOf(caseId), {
    revision,
    at: "2026-12-01T10:00:00Z",
    draft: { answers: heat("7K3391") },
  });
  const { result } = renderHook(() => useAnswers(aPage(caseId)));
  await waitFor(() => expect(result.current.aside).toHaveLength(1));
  const [kept] = result.current.aside;
  if (!kept) throw new Error("nothing was kept");
  act(() => result.current.putBack(kept));
  await waitFor(() => expect(result.current.saving.state.kind).toMatch(/saved|conflict/));
  return result;
}

test("answers put back go on from what they were written on", async () => {
  const page = await openWithKept("case_1", 5);
  await waitFor(() => expect(sent).toEqual([{ revision: 5, answers: heat("7K3391") }]));
  expect(page.current.saving.state.kind).toBe("saved");
  expect(page.current.answers).toEqual(heat("7K3391"));
  expect(page.current.aside).toEqual([]);
});

test("answers put back do not write over newer ones: both are shown, and nothing was saved", async () => {
  const page = await openWithKept("case_2", 3);
  expect(sent).toEqual([{ revision: 3, answers: heat("7K3391") }]);
  expect(page.current.saving.state).toMatchObject({
    kind: "conflict",
    conflict: {
      yours: { answers: heat("7K3391") },
      theirs: { answers: heat("7K3392") },
    },
  });
});

test("taking the newer ones keeps one's own on the device", async () => {
  const page = await openWithKept("case_3", 3);
  act(() => page.current.takeTheirs());
  expect(page.current.answers).toEqual(heat("7K3392"));
  expect(page.current.aside).toMatchObject([{ draft: { answers: heat("7K3391") } }]);
  expect(readFromDevice(`${keyOf("case_3")}.aside`)).toMatchObject([
    { draft: { answers: heat("7K3391") } },
  ]);
});

test("keeping one's own writes them over the newer ones", async () => {
  const page = await openWithKept("case_4", 3);
  act(() => page.current.saving.overrule(5));
  await waitFor(() => expect(page.current.saving.state.kind).toBe("saved"));
  expect(sent.at(-1)).toEqual({ revision: 5, answers: heat("7K3391") });
});
