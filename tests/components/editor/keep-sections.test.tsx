import { afterEach, describe, expect, test, vi } from "vitest";
import { Editor } from "@tiptap/core";
import { KeepSections } from "@/components/editor/keep-sections";
import type { DocumentNode } from "@/lib/findings/document";
import { documentProblem, findingsDocument } from "@/lib/findings/document-schema";
import { FINDINGS_EXTENSIONS } from "@/lib/findings/extensions";
import { SECTIONS } from "@/lib/findings/sections";
import { startingDocument } from "@/lib/findings/starting-document";
import { findingsWith, words } from "../../helpers/findings-text";

// jsdom has no clipboard; what is pasted is handed over as HTML.
vi.stubGlobal("ClipboardEvent", Event);

let editor: Editor;
afterEach(() => editor.destroy());

const KEYS = SECTIONS.map(({ key }) => key);
const open = (document: DocumentNode = startingDocument()) => {
  editor = new Editor({ extensions: [...FINDINGS_EXTENSIONS, KeepSections], content: document });
};
const heads = () => {
  const keys: string[] = [];
  editor.state.doc.forEach((node) => {
    if (node.type.name === "sectionHeading") keys.push(String(node.attrs.key));
  });
  return keys;
};
/** Position inside the first line under a section. */
const under = (key: string) => {
  let found = -1;
  editor.state.doc.forEach((node, position) => {
    if (node.attrs.key === key) found = position + node.nodeSize + 1;
  });
  return found;
};
const textUnder = (key: string) => editor.state.doc.resolve(under(key)).parent.textContent;
const press = (key: string) =>
  editor.view.someProp("handleKeyDown", (handle) =>
    handle(editor.view, new KeyboardEvent("keydown", { key })),
  ) ?? false;

describe("the sections of the findings", () => {
  test("all come back when everything is deleted, and the text is a document still", () => {
    open();
    editor.commands.insertContentAt(under("hardness"), "Soft at the fillet.");
    editor.chain().selectAll().deleteSelection().run();
    expect(heads()).toEqual(KEYS);
    expect(editor.getText()).not.toContain("Soft");
    expect(findingsDocument.safeParse(editor.getJSON()).success).toBe(true);
  });

  test("come back in their place when a stretch over three of them is deleted", () => {
    open();
    editor.commands.insertContentAt(under("microstructure"), "after");
    editor.commands.insertContentAt(under("sent"), "before");
    editor
      .chain()
      .setTextSelection({ from: under("sent") + 3, to: under("microstructure") + 2 })
      .deleteSelection()
      .run();
    expect(heads()).toEqual(KEYS);
    expect(textUnder("sent")).toBe("befter");
    expect(textUnder("microstructure")).toBe("");
  });

  test("stand once when a copy is pasted", () => {
    open();
    editor.commands.insertContentAt(under("weighing"), [
      { type: "sectionHeading", attrs: { key: "answer", title: "Answer" } },
      { type: "paragraph", content: [{ type: "text", text: "pasted" }] },
    ]);
    expect(heads()).toEqual(KEYS);
    expect(editor.getText()).toContain("pasted");
  });

  test("keep their text at Backspace and Delete", () => {
    open();
    editor.commands.insertContentAt(under("hardness"), "Soft");
    editor.commands.setTextSelection(under("hardness"));
    expect(press("Backspace")).toBe(true);
    expect(textUnder("hardness")).toBe("Soft");
    editor.commands.setTextSelection(under("hardness") + 4);
    expect(press("Delete")).toBe(true);
    expect(heads()).toEqual(KEYS);
  });

  test("come back with their text in one step of Undo", () => {
    open(findingsWith(words("Hard"), words("Soft")));
    editor.chain().selectAll().deleteSelection().run();
    editor.commands.undo();
    expect(textUnder("answer")).toBe("Hard");
    expect(editor.getText()).toContain("Soft");
    expect(heads()).toEqual(KEYS);
  });
});

describe("what is pasted", () => {
  const paste = (html: string) => {
    open();
    editor.commands.setTextSelection(under("answer"));
    editor.view.pasteHTML(html);
    return editor.getJSON();
  };

  test("from a word processor loses what findings do not hold", () => {
    const document = paste(
      '<p class="MsoNormal" style="color:red" onclick="x()"><o:p></o:p><b>Bold</b> <font face="Arial">face</font></p><img src="https://example.test/x.png" onerror="x()"><script>x()</script><a href="javascript:alert(1)">link</a>',
    );
    expect(documentProblem(document)).toBeNull();
    const text = JSON.stringify(document);
    expect(text).toContain("Bold");
    expect(text).not.toMatch(/MsoNormal|onclick|onerror|script|example\.test|Arial/);
  });

  test("from the findings keeps a cited value bound", () => {
    open();
    const cited = {
      recordId: "rec_1",
      versionId: "ver_1",
      field: "caseDepth",
      text: "1.95 mm",
      tag: "T2",
    };
    editor.commands.insertContentAt(under("answer"), [
      { type: "text", text: "It is " },
      { type: "citedValue", attrs: { ...cited, keptReason: "Read before." } },
    ]);
    const copied = editor.getHTML();
    editor.destroy();
    const pasted = JSON.stringify(paste(copied));
    expect(pasted).toContain(JSON.stringify({ ...cited, keptReason: "Read before." }));
  });

  test("keeps a figure with its caption, and without marks", () => {
    open();
    const figure = {
      type: "figure",
      attrs: { imageId: "rec_2", caption: "E1.1, origin", withMarks: false },
    };
    editor.commands.insertContentAt(under("answer"), figure);
    const copied = editor.getHTML();
    editor.destroy();
    expect(paste(copied).content).toContainEqual(figure);
  });
});
