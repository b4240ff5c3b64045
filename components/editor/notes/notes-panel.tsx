"use client";

import { type Ref, useImperativeHandle, useRef, useState } from "react";
import type { Editor } from "@tiptap/react";
import { Button } from "@/components/ui/button";
import { Kbd } from "@/components/ui/kbd";
import { LinkButton } from "@/components/ui/link-button";
import type { ReviewNote } from "@/lib/findings/constants";
import { sectionTexts } from "@/lib/findings/passages";
import { SECTIONS } from "@/lib/findings/sections";
import { routes } from "@/lib/routes";
import { useFindingsSources } from "../findings-context";
import { LeaveNoteForm } from "./leave-note-form";
import type { NoteActs } from "./note-acts";
import { NoteItem } from "./note-item";
import { chosenPlace, type NotePlace, placeOfNote } from "./note-places";

export type NotesHandle = { leave: () => void };
type Props = {
  ref: Ref<NotesHandle>;
  caseId: string;
  notes: readonly ReviewNote[];
  acts: NoteActs;
  editor: Editor;
  onShow: (position: number) => void;
};

/** Notes of the second reader beside the text, open ones first, and the way to leave one. */
export function NotesPanel({ ref, caseId, notes, acts, editor, onShow }: Props) {
  const { picture, chart } = useFindingsSources();
  const [place, setPlace] = useState<NotePlace | null>(null);
  const opener = useRef<HTMLButtonElement>(null);
  const leave = () => setPlace(chosenPlace(editor));
  useImperativeHandle(ref, () => ({ leave }));
  if (notes.length === 0 && !acts.mayLeave) return null;

  const { doc } = editor.state;
  const sections = sectionTexts(doc);
  const figureName = (figureId: string | null) =>
    figureId === null ? null : ((picture(figureId) ?? chart(figureId))?.label ?? "a figure");
  const open = notes.filter(({ state }) => state === "open");
  const settled = notes.filter(({ state }) => state !== "open");
  const item = (note: ReviewNote) => {
    const at = placeOfNote(doc, sections, note);
    const title = SECTIONS.find(({ key }) => key === note.section)?.title ?? "";
    const figure = figureName(note.figureId);
    return (
      <NoteItem
        key={note.id}
        note={note}
        caseId={caseId}
        place={figure === null ? title : `Figure of ${figure}, ${title}`}
        isPlaceGone={at === null && (note.passage !== "" || note.figureId !== null)}
        acts={acts}
        onShow={() => onShow(at?.from ?? sections.get(note.section)?.head ?? 0)}
      />
    );
  };
  return (
    <section
      aria-label="Notes of the second reader"
      className="border-b border-rule-2 px-4 pt-4 pb-1"
    >
      <div className="flex items-center justify-between gap-2">
        <h2 className="text-13 font-head">
          Notes{" "}
          <span className="font-normal text-ink-2">
            {open.length === 0 ? "none open" : `${open.length} open`}
          </span>
        </h2>
        {acts.mayLeave && !place && (
          <Button small ref={opener} onClick={leave}>
            Leave a note
          </Button>
        )}
      </div>
      {acts.mayLeave && (
        <p className="py-1 text-12 text-ink-3">
          Choose words in the text and press <Kbd>Ctrl</Kbd> <Kbd>Alt</Kbd> <Kbd>M</Kbd>. The author
          answers each note.
        </p>
      )}
      {place && (
        <LeaveNoteForm
          place={place}
          figure={figureName(place.figureId)}
          onSend={(note) => acts.leave({ caseId, ...note })}
          onClose={() => {
            setPlace(null);
            requestAnimationFrame(() => opener.current?.focus());
          }}
        />
      )}
      <ul>{open.map(item)}</ul>
      {settled.length > 0 && (
        <details className="border-t border-rule py-2 text-13">
          <summary className="cursor-pointer text-ink-2">{settled.length} settled</summary>
          <ul>{settled.map(item)}</ul>
        </details>
      )}
      {acts.mayLeave && (
        <p className="py-2">
          <LinkButton small href={routes.signOff(caseId)}>
            Record the reading
          </LinkButton>
        </p>
      )}
    </section>
  );
}
