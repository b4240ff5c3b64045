import { Extension } from "@tiptap/core";
import type { Node as PartNode } from "@tiptap/pm/model";
import { Plugin } from "@tiptap/pm/state";
import { Decoration, DecorationSet } from "@tiptap/pm/view";
import { CITED_VALUE, SECTION_HEADING } from "@/lib/findings/document";
import { SECTION_HINTS, SECTIONS } from "@/lib/findings/sections";

type Section = {
  key: string;
  head: number;
  headSize: number;
  first: number | null;
  isEmpty: boolean;
};

function hasWords(node: PartNode): boolean {
  if (node.type.name !== "paragraph") return true;
  let found = false;
  node.descendants((child) => {
    found ||= child.type.name === CITED_VALUE || (child.text ?? "").trim() !== "";
  });
  return found;
}

function sectionsOf(doc: PartNode): Section[] {
  const sections: Section[] = [];
  doc.forEach((node, position) => {
    if (node.type.name === SECTION_HEADING) {
      const key = String(node.attrs.key);
      sections.push({ key, head: position, headSize: node.nodeSize, first: null, isEmpty: true });
      return;
    }
    const section = sections.at(-1);
    if (!section) return;
    section.first ??= position;
    if (hasWords(node)) section.isEmpty = false;
  });
  return sections;
}

/** Numbers as the report prints them: the answer has none, and what is empty is not printed. */
function marksOf(doc: PartNode): DecorationSet {
  const marks: Decoration[] = [];
  let number = 0;
  for (const { key, head, headSize, first, isEmpty } of sectionsOf(doc)) {
    if (!isEmpty && key !== "answer") {
      number += 1;
      marks.push(
        Decoration.node(head, head + headSize, { style: `--section-number: "${number}"` }),
      );
    }
    const hint = SECTIONS.find((section) => section.key === key);
    const size = first === null ? 0 : (doc.nodeAt(first)?.nodeSize ?? 0);
    if (isEmpty && hint && first !== null) {
      marks.push(Decoration.node(first, first + size, { "data-hint": SECTION_HINTS[hint.key] }));
    }
  }
  return DecorationSet.create(doc, marks);
}

/** Numbers the sections as the report does, and says in an empty one what belongs there. */
export const NumberSections = Extension.create({
  name: "numberSections",
  addProseMirrorPlugins: () => [
    new Plugin<DecorationSet>({
      state: {
        init: (_config, state) => marksOf(state.doc),
        apply: (transaction, marks) => (transaction.docChanged ? marksOf(transaction.doc) : marks),
      },
      props: {
        decorations(state) {
          return this.getState(state);
        },
      },
    }),
  ],
});
