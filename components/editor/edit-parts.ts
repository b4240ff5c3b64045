import type { Editor } from "@tiptap/react";
import { CHART_FIGURE, CITED_VALUE, FIGURE } from "@/lib/findings/document";
import type { CitableValue } from "./cite-panel";
import type { StaleValue } from "./unsettled-values";
import type { PictureSource, TraverseSource } from "./use-sources";

/** Puts a cited value where the cursor stands, and the cursor after it. */
export function putInValue(editor: Editor, value: CitableValue): void {
  const { recordId, versionId, field, text, tag } = value;
  // At once, so that what is typed next lands in the text and not in the search.
  editor.view.focus();
  editor
    .chain()
    .focus()
    .insertContent([
      { type: CITED_VALUE, attrs: { recordId, versionId, field, text, tag } },
      { type: "text", text: " " },
    ])
    .run();
}

export function putInPicture(editor: Editor, { id, caption }: PictureSource): void {
  editor
    .chain()
    .focus()
    .insertContent({ type: FIGURE, attrs: { imageId: id, caption, withMarks: true } })
    .run();
}

export function putInChart(editor: Editor, { id, label, name }: TraverseSource): void {
  const caption = `Hardness against depth, ${label} ${name}. Bars are expanded uncertainty, k = 2.`;
  editor
    .chain()
    .focus()
    .insertContent({ type: CHART_FIGURE, attrs: { traverseId: id, caption } })
    .run();
}

/** Brings stale values to what their sources say now, all in one step of Undo. */
export function takeNewValues(editor: Editor, values: readonly StaleValue[]): void {
  editor
    .chain()
    .command(({ tr }) => {
      for (const { position, now } of values) {
        const node = tr.doc.nodeAt(position);
        if (node?.type.name !== CITED_VALUE) continue;
        const { versionId, text } = now;
        tr.setNodeMarkup(position, undefined, { ...node.attrs, versionId, text, keptReason: null });
      }
      return tr.docChanged;
    })
    .run();
}

/** Lets a stale value stand, with the reason that the report prints. */
export function keepOldValue(editor: Editor, position: number, keptReason: string): void {
  editor
    .chain()
    .command(({ tr }) => {
      const node = tr.doc.nodeAt(position);
      if (node?.type.name !== CITED_VALUE) return false;
      tr.setNodeMarkup(position, undefined, { ...node.attrs, keptReason });
      return true;
    })
    .run();
}

export function takeOut(editor: Editor, position: number): void {
  editor
    .chain()
    .deleteRange({ from: position, to: position + 1 })
    .run();
}

/** Brings a place into view: a part is selected, words get the cursor before them. */
export function showPart(editor: Editor, position: number): void {
  const node = editor.state.doc.nodeAt(position);
  const chain = editor.chain();
  (node && node.isAtom && !node.isText && node.type.spec.selectable !== false
    ? chain.setNodeSelection(position)
    : chain.setTextSelection(position)
  )
    .focus()
    .scrollIntoView()
    .run();
  // Where nothing can be written the library scrolls nowhere.
  const shown = editor.view.nodeDOM(position) ?? editor.view.domAtPos(position).node;
  const element = shown instanceof HTMLElement ? shown : shown.parentElement;
  element?.scrollIntoView({ block: "center" });
}
