import { cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { Editor } from "@tiptap/core";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { FindingsProvider } from "@/components/editor/findings-context";
import { NoteMarks, showNotes } from "@/components/editor/notes/note-marks";
import { NotesPanel } from "@/components/editor/notes/notes-panel";
import type { NoteActs } from "@/components/editor/notes/note-acts";
import type { ReviewNote } from "@/lib/findings/constants";
import { FIGURE } from "@/lib/findings/document";
import { FINDINGS_EXTENSIONS } from "@/lib/findings/extensions";
import { findPassage, sectionTexts } from "@/lib/findings/passages";
import { findingsWith, words } from "../../helpers/findings-text";

const TEXT = findingsWith(
  words("The layer stops short of the place of highest stress."),
  { type: FIGURE, attrs: { imageId: "img_1", caption: "Origin" } },
  words("A fillet left unhardened carries the stress."),
);
const note = (change: Partial<ReviewNote> = {}): ReviewNote => ({
  id: "note_1",
  number: 2,
  section: "answer",
  passage: "left unhardened",
  figureId: null,
  kind: "unsupported",
  severity: "major",
  words: "Say what the core carries.",
  state: "open",
  by: "Sanna Reeve",
  at: "2026-11-30T09:00:00Z",
  replies: [],
  ...change,
});

let editor: Editor;
beforeEach(() => {
  editor = new Editor({ extensions: [...FINDINGS_EXTENSIONS, NoteMarks], content: TEXT });
});
afterEach(() => {
  cleanup();
  editor.destroy();
});

function show(
  notes: ReviewNote[],
  may: { mayLeave?: boolean; mayAnswer?: boolean; answer?: NoteActs["answer"] } = {},
) {
  const done = () => Promise.resolve({ ok: true as const, value: undefined });
  const acts = {
    mayLeave: may.mayLeave ?? false,
    mayAnswer: may.mayAnswer ?? false,
    leave: vi.fn<NoteActs["leave"]>(done),
    answer: vi.fn<NoteActs["answer"]>(may.answer ?? done),
    giveBack: vi.fn<NoteActs["giveBack"]>(done),
  };
  const onShow = vi.fn();
  render(
    <FindingsProvider
      value={{
        citedLook: () => ({ state: "current", now: null }),
        picture: () => ({ label: "IM-03", caption: "Origin" }),
        chart: () => null,
      }}
    >
      <NotesPanel
        ref={null}
        caseId="case_1"
        notes={notes}
        acts={acts}
        editor={editor}
        onShow={onShow}
      />
    </FindingsProvider>,
  );
  return { ...acts, onShow };
}

describe("marks of notes in the text", () => {
  test("words stand over a dotted line with their number after them; the text itself is unchanged", () => {
    const before = editor.getJSON();
    showNotes(editor, [note()]);
    expect(editor.view.dom.querySelector(".note-passage")?.textContent).toBe("left unhardened");
    expect(editor.view.dom.querySelector(".note-number")?.textContent).toBe("2");
    expect(editor.getJSON()).toEqual(before);
    expect(editor.can().undo()).toBe(false);
  });

  test("a figure, a section and words that are gone carry the number beside them", () => {
    showNotes(editor, [
      note({ number: 1, passage: "", figureId: "img_1" }),
      note({ number: 2, passage: "" }),
      note({ number: 3, passage: "words that were rewritten" }),
    ]);
    const marked = [...editor.view.dom.querySelectorAll("[data-notes]")];
    expect(marked.map((part) => [part.tagName, part.getAttribute("data-notes")])).toEqual([
      ["H2", "2, 3"],
      ["FIGURE", "1"],
    ]);
  });

  test("follow their words while one writes before them, and leave when the words are changed", () => {
    showNotes(editor, [note()]);
    const at = findPassage(sectionTexts(editor.state.doc), "answer", "left unhardened");
    if (!at) throw new Error("not there");
    editor.commands.insertContentAt(at.from - 2, "soft ");
    expect(editor.view.dom.querySelector(".note-passage")?.textContent).toBe("left unhardened");
    editor.commands.insertContentAt(at.from + 10, "x");
    expect(editor.view.dom.querySelector(".note-passage")).toBeNull();
    expect(editor.view.dom.querySelector("[data-notes='2']")).not.toBeNull();
  });
});

describe("the author", () => {
  test("sees where, by whom and what, and answers in words or says that it is done", async () => {
    const { answer } = show([note()], { mayAnswer: true });
    const item = screen.getByRole("listitem");
    for (const said of ["Note 2", "Sanna Reeve", "Not supported", "Say what the core carries."])
      expect(item.textContent).toContain(said);
    fireEvent.click(screen.getByRole("button", { name: "Answer" }));
    fireEvent.change(screen.getByLabelText("Your answer"), { target: { value: "242 MPa." } });
    fireEvent.click(screen.getByRole("button", { name: "Answer" }));
    await waitFor(() => expect(screen.queryByLabelText("Your answer")).toBeNull());
    fireEvent.click(screen.getByRole("button", { name: "Done" }));
    await waitFor(() =>
      expect(answer.mock.calls).toEqual([
        [{ caseId: "case_1", noteId: "note_1", act: "answered", words: "242 MPa." }],
        [{ caseId: "case_1", noteId: "note_1", act: "done", words: "" }],
      ]),
    );
    expect(screen.queryByRole("button", { name: "Withdraw" })).toBeNull();
  });

  test("keeps what was typed when the answer is refused", async () => {
    show([note()], {
      mayAnswer: true,
      answer: () =>
        Promise.resolve({ ok: false, error: { message: "Note 2 is done already. Kept here." } }),
    });
    fireEvent.click(screen.getByRole("button", { name: "Answer" }));
    fireEvent.change(screen.getByLabelText("Your answer"), { target: { value: "242 MPa." } });
    fireEvent.click(screen.getByRole("button", { name: "Answer" }));
    expect((await screen.findByRole("alert")).textContent).toContain("Note 2 is done already");
    expect(screen.getByLabelText<HTMLTextAreaElement>("Your answer").value).toBe("242 MPa.");
  });

  test("is told that the words are gone, and led to the section", () => {
    const { onShow } = show([note({ passage: "rewritten since" })], { mayAnswer: true });
    expect(screen.getByText(/does not stand in the text/)).toBeTruthy();
    fireEvent.click(screen.getByRole("button", { name: "Show it" }));
    expect(onShow).toHaveBeenCalledExactlyOnceWith(0);
  });
});

describe("the second reader", () => {
  test("leaves a note at the words that are chosen in the text", async () => {
    const at = findPassage(sectionTexts(editor.state.doc), "answer", "carries the stress");
    if (!at) throw new Error("not there");
    editor.commands.setTextSelection(at);
    const { leave } = show([], { mayLeave: true });
    fireEvent.click(screen.getByRole("button", { name: "Leave a note" }));
    fireEvent.change(screen.getByLabelText("What should change"), {
      target: { value: "Which stress?" },
    });
    fireEvent.change(screen.getByLabelText("Kind"), { target: { value: "error" } });
    fireEvent.click(screen.getByRole("button", { name: "Leave the note" }));
    await waitFor(() =>
      expect(leave).toHaveBeenCalledExactlyOnceWith({
        caseId: "case_1",
        section: "answer",
        passage: "carries the stress",
        figureId: null,
        kind: "error",
        severity: "major",
        words: "Which stress?",
      }),
    );
  });

  test("leaves a note at a chosen figure", async () => {
    const { leave } = show([], { mayLeave: true });
    let position = 0;
    editor.state.doc.descendants((node, at) => {
      if (node.type.name === FIGURE) position = at;
    });
    editor.commands.setNodeSelection(position);
    fireEvent.click(screen.getByRole("button", { name: "Leave a note" }));
    expect(screen.getByText("About the figure of IM-03")).toBeTruthy();
    fireEvent.click(screen.getByRole("button", { name: "Leave the note" }));
    await waitFor(() =>
      expect(leave.mock.calls).toMatchObject([[{ figureId: "img_1", passage: "" }]]),
    );
  });

  test("opens a settled note again with words, and answers none", async () => {
    const { giveBack } = show(
      [
        note({
          state: "done",
          replies: [
            { act: "done", words: "", byId: "p", by: "Idris Vale", at: "2026-12-01T10:00:00Z" },
          ],
        }),
      ],
      { mayLeave: true },
    );
    const settled = screen.getByText("1 settled").closest("details");
    if (!settled) throw new Error("no list of settled notes");
    expect(settled.textContent).toContain("Idris Vale changed the text as asked");
    expect(within(settled).queryByRole("button", { name: "Answer" })).toBeNull();
    fireEvent.click(within(settled).getByText("Open again"));
    fireEvent.change(screen.getByLabelText("What is still open"), { target: { value: "Where?" } });
    fireEvent.click(screen.getByText("Open again"));
    await waitFor(() =>
      expect(giveBack.mock.calls).toEqual([
        [{ caseId: "case_1", noteId: "note_1", act: "reopened", words: "Where?" }],
      ]),
    );
  });
});

test("nothing is shown where there is no note and none can be left", () => {
  show([]);
  expect(screen.queryByRole("region")).toBeNull();
});
