import { type Editor, Extension } from "@tiptap/core";
import type { Node as PartNode } from "@tiptap/pm/model";
import { Plugin, PluginKey } from "@tiptap/pm/state";
import { Decoration, DecorationSet } from "@tiptap/pm/view";
import type { ReviewNote } from "@/lib/findings/constants";
import { sectionTexts } from "@/lib/findings/passages";
import { placeOfNote } from "./note-places";

type Marked = { notes: readonly ReviewNote[]; marks: DecorationSet };
const key = new PluginKey<Marked>("noteMarks");

/** Words under a dotted line with the note's number after them; figures and heads with it beside. */
function marksOf(doc: PartNode, notes: readonly ReviewNote[]): DecorationSet {
  const sections = sectionTexts(doc);
  const numbers = new Map<number, number[]>();
  const marks: Decoration[] = [];
  for (const note of notes) {
    const place = placeOfNote(doc, sections, note);
    if (place && note.figureId === null) {
      marks.push(
        Decoration.inline(place.from, place.to, { class: "note-passage" }),
        Decoration.widget(place.to, () => numberMark(note.number), {
          side: -1,
          key: `note-${note.number}`,
        }),
      );
      continue;
    }
    // A passage that was rewritten leaves its note at the head of the section.
    const at = place?.from ?? sections.get(note.section)?.head;
    if (at !== undefined) numbers.set(at, [...(numbers.get(at) ?? []), note.number]);
  }
  for (const [at, own] of numbers) {
    const size = doc.nodeAt(at)?.nodeSize ?? 0;
    marks.push(Decoration.node(at, at + size, { "data-notes": own.join(", ") }));
  }
  return DecorationSet.create(doc, marks);
}

function numberMark(number: number): HTMLElement {
  const mark = document.createElement("sup");
  mark.className = "note-number";
  mark.textContent = String(number);
  return mark;
}

/** Shows these notes in the text; they are no part of it. */
export function showNotes(editor: Editor, notes: readonly ReviewNote[]): void {
  editor.commands.command(({ tr }) => {
    tr.setMeta(key, notes).setMeta("addToHistory", false);
    return true;
  });
}

export const NoteMarks = Extension.create({
  name: "noteMarks",
  addProseMirrorPlugins: () => [
    new Plugin<Marked>({
      key,
      state: {
        init: () => ({ notes: [], marks: DecorationSet.empty }),
        apply(transaction, before) {
          const notes: readonly ReviewNote[] = transaction.getMeta(key) ?? before.notes;
          return notes === before.notes && !transaction.docChanged
            ? before
            : { notes, marks: marksOf(transaction.doc, notes) };
        },
      },
      props: { decorations: (state) => key.getState(state)?.marks },
    }),
  ],
});
