import type { Editor } from "@tiptap/react";
import type { Node as PartNode } from "@tiptap/pm/model";
import { NodeSelection } from "@tiptap/pm/state";
import { CHART_FIGURE, FIGURE } from "@/lib/findings/document";
import { PASSAGE_MAX, type ReviewNote } from "@/lib/findings/constants";
import { findFigure, findPassage, passageAt, sectionTexts } from "@/lib/findings/passages";
import { SECTIONS, type SectionKey } from "@/lib/findings/sections";

export type NotePlace = { section: SectionKey; passage: string; figureId: string | null };
type Range = { from: number; to: number };

const sectionKey = (key: string): SectionKey =>
  SECTIONS.find((section) => section.key === key)?.key ?? SECTIONS[0].key;

/** The place that is chosen in the text: a figure, words, or the section of the cursor. */
export function chosenPlace(editor: Editor): NotePlace {
  const { selection, doc } = editor.state;
  const at = passageAt(doc, selection);
  const section = sectionKey(at?.section ?? "");
  if (selection instanceof NodeSelection) {
    const { type, attrs } = selection.node;
    if (type.name === FIGURE || type.name === CHART_FIGURE) {
      return { section, passage: "", figureId: String(attrs.imageId ?? attrs.traverseId) };
    }
  }
  return { section, passage: (at?.passage ?? "").slice(0, PASSAGE_MAX).trim(), figureId: null };
}

/** Where a note's own words or figure stand now; null where they are gone, or it names none. */
export function placeOfNote(
  doc: PartNode,
  sections: ReturnType<typeof sectionTexts>,
  note: Pick<ReviewNote, "section" | "passage" | "figureId">,
): Range | null {
  if (note.figureId !== null) return findFigure(doc, note.figureId);
  return note.passage === "" ? null : findPassage(sections, note.section, note.passage);
}
