import { Editor } from "@tiptap/core";
import { afterEach, expect, test } from "vitest";
import { NumberSections } from "@/components/editor/number-sections";
import { FIGURE, type DocumentNode, SECTION_HEADING } from "@/lib/findings/document";
import { FINDINGS_EXTENSIONS } from "@/lib/findings/extensions";
import { SECTION_HINTS, type SectionKey, SECTIONS } from "@/lib/findings/sections";
import { words } from "../../helpers/findings-text";

let editor: Editor;
afterEach(() => editor.destroy());

function open(written: Partial<Record<SectionKey, DocumentNode[]>>) {
  editor = new Editor({
    extensions: [...FINDINGS_EXTENSIONS, NumberSections],
    content: {
      type: "doc",
      content: SECTIONS.flatMap(({ key, title }) => [
        { type: SECTION_HEADING, attrs: { key, title } },
        ...(written[key] ?? [{ type: "paragraph" }]),
      ]),
    },
  });
}
const numbers = () =>
  [...editor.view.dom.querySelectorAll<HTMLElement>("h2[data-key]")]
    .map((head) => [head.dataset.key, head.style.getPropertyValue("--section-number")])
    .filter(([, number]) => number !== "");
const hint = (key: SectionKey) =>
  editor.view.dom.querySelector(`h2[data-key=${key}] + p`)?.getAttribute("data-hint") ?? null;

test("numbers are those of the report: the answer has none, and empty sections are not counted", () => {
  open({
    answer: [words("It broke by fatigue.")],
    scope: [words("Why?")],
    hardness: [words(" ")],
    strength: [{ type: FIGURE, attrs: { imageId: "img_1", caption: "" } }],
    actions: [words("Look at the rest.")],
  });
  expect(numbers()).toEqual([
    ["scope", '"1"'],
    ["strength", '"2"'],
    ["actions", '"3"'],
  ]);
});

test("an empty section says what belongs there, until something is written", () => {
  open({ scope: [words("Why?")] });
  expect([hint("answer"), hint("scope"), hint("custody")]).toEqual([
    SECTION_HINTS.answer,
    null,
    SECTION_HINTS.custody,
  ]);
  let at = 0;
  editor.state.doc.forEach((node, position) => {
    if (node.attrs.key === "custody") at = position + node.nodeSize + 1;
  });
  editor.commands.insertContentAt(at, "Unbroken.");
  expect(hint("custody")).toBeNull();
  expect(numbers()).toEqual([
    ["scope", '"1"'],
    ["custody", '"2"'],
  ]);
});
