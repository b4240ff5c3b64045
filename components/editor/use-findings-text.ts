"use client";

import { useEffect } from "react";
import { type Content, useEditor } from "@tiptap/react";
import { TEXT_EXTENSIONS } from "@/lib/findings/extensions";
import { KeepSections } from "./keep-sections";
import { NoteMarks } from "./notes/note-marks";
import { NumberSections } from "./number-sections";
import { SHOWN_PARTS } from "./part-views";

type Options = {
  document: unknown;
  isReadOnly: boolean;
  onWrite: (document: unknown) => void;
  /** `@` was typed: a value is to be cited. */
  onCite: () => void;
};

/** The editor of the findings; null until the page is there. */
export function useFindingsText({ document, isReadOnly, onWrite, onCite }: Options) {
  const editor = useEditor({
    immediatelyRender: false,
    editable: !isReadOnly,
    extensions: [...TEXT_EXTENSIONS, ...SHOWN_PARTS, KeepSections, NumberSections, NoteMarks],
    content: document as Content,
    editorProps: {
      attributes: {
        "aria-label": "Findings",
        class: "findings-text raw outline-none",
        role: "textbox",
        "aria-multiline": "true",
        ...(isReadOnly && { "aria-readonly": "true" }),
      },
      handleKeyDown: (_view, event) => {
        if (event.key !== "@" || isReadOnly) return false;
        event.preventDefault();
        onCite();
        return true;
      },
    },
    onUpdate: ({ editor }) => onWrite(editor.getJSON()),
  });
  // The library keeps an editor as it was made; the case may have moved on meanwhile.
  useEffect(() => {
    editor?.setEditable(!isReadOnly, false);
  }, [editor, isReadOnly]);
  return editor;
}
