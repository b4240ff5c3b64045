import { type Editor, Extension } from "@tiptap/core";
import type { Node as PartNode } from "@tiptap/pm/model";
import { Plugin } from "@tiptap/pm/state";
import { SECTION_HEADING } from "@/lib/findings/document";
import { SECTIONS } from "@/lib/findings/sections";

const PLACE = new Map<string, number>(SECTIONS.map(({ key }, i) => [key, i]));
type Head = { position: number; size: number; place: number };

function headsOf(doc: PartNode): Head[] {
  const heads: Head[] = [];
  doc.forEach((node, position) => {
    if (node.type.name === SECTION_HEADING) {
      heads.push({ position, size: node.nodeSize, place: PLACE.get(String(node.attrs.key)) ?? -1 });
    }
  });
  return heads;
}

/** Heads that stand twice or out of order. */
function strayHeads(heads: readonly Head[]): Head[] {
  let last = -1;
  return heads.filter(({ place }) => {
    if (place <= last) return true;
    last = place;
    return false;
  });
}

/** Whether the cursor stands at the edge of a block with the head of a section beyond it. */
function isBesideHead(editor: Editor, side: "before" | "after"): boolean {
  const { selection } = editor.state;
  const { $from } = selection;
  if (!selection.empty || $from.depth !== 1) return false;
  const isAtEdge = $from.parentOffset === (side === "before" ? 0 : $from.parent.content.size);
  const index = $from.index(0) + (side === "before" ? -1 : 1);
  return isAtEdge && editor.state.doc.maybeChild(index)?.type.name === SECTION_HEADING;
}

/**
 * Keeps every section of the findings in its place: a head that was deleted with the text around
 * it comes back, with an empty line under it, and a pasted second one goes.
 */
export const KeepSections = Extension.create({
  name: "keepSections",
  priority: 1000,
  // Without this the text of a section would slip into the one before.
  addKeyboardShortcuts: () => ({
    Backspace: ({ editor }) => isBesideHead(editor, "before"),
    Delete: ({ editor }) => isBesideHead(editor, "after"),
  }),
  addProseMirrorPlugins: () => [
    new Plugin({
      appendTransaction: (transactions, _before, state) => {
        if (!transactions.some((transaction) => transaction.docChanged)) return null;
        const { tr, schema } = state;
        for (const head of strayHeads(headsOf(tr.doc)).reverse()) {
          tr.delete(head.position, head.position + head.size);
        }
        const heads = headsOf(tr.doc);
        const { paragraph, [SECTION_HEADING]: heading } = schema.nodes;
        if (!paragraph || !heading) return null;
        // From the last to the first, so that positions before stay true.
        for (const [place, { key, title }] of [...SECTIONS.entries()].reverse()) {
          if (heads.some((head) => head.place === place)) continue;
          const next = heads.find((head) => head.place > place);
          const isFirst = place === 0;
          const at = isFirst ? 0 : (next?.position ?? tr.doc.content.size);
          const head = heading.create({ key, title });
          const written = isFirst && tr.doc.firstChild?.type === paragraph;
          tr.insert(at, written ? [head] : [head, paragraph.create()]);
          heads.push({ position: at, size: head.nodeSize, place });
          heads.sort((a, b) => a.place - b.place);
        }
        return tr.docChanged ? tr : null;
      },
    }),
  ],
});
