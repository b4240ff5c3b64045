"use client";

import { useState } from "react";
import { type Answer, useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { SelectField, TextAreaField, TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import {
  NOTE_KIND_NAMES,
  NOTE_KINDS,
  NOTE_SEVERITIES,
  NOTE_SEVERITY_NAMES,
  NOTE_WORDS_MAX,
  PASSAGE_MAX,
} from "@/lib/findings/constants";
import { SECTIONS } from "@/lib/findings/sections";
import type { NotePlace } from "./note-places";

type Written = NotePlace & {
  kind: (typeof NOTE_KINDS)[number];
  severity: (typeof NOTE_SEVERITIES)[number];
  words: string;
};
type Props = {
  place: NotePlace;
  /** What the figure at the place shows: "IM-03"; null where the note is about words. */
  figure: string | null;
  onSend: (note: Written) => Promise<Answer<unknown>>;
  onClose: () => void;
};

const chosen = <T extends string>(
  known: readonly T[],
  value: FormDataEntryValue | null,
  first: T,
) => known.find((one) => one === value) ?? first;

/** A new note of the second reader: where, what kind, and what should change. */
export function LeaveNoteForm({ place, figure, onSend, onClose }: Props) {
  const form = useActionForm<unknown>();
  const [section, setSection] = useState(place.section);
  const [passage, setPassage] = useState(place.passage);
  return (
    <form
      aria-label="Leave a note"
      className="grid gap-2.5 border-b border-rule pb-3"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        const note = {
          section,
          passage,
          figureId: place.figureId,
          kind: chosen(NOTE_KINDS, data.get("noteKind"), "unclear"),
          severity: chosen(NOTE_SEVERITIES, data.get("noteSeverity"), "major"),
          words: String(data.get("noteWords") ?? ""),
        };
        form.send(() => onSend(note), onClose);
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="The note was not left." live="assertive">
          {form.failure}
        </Notice>
      )}
      <TextAreaField
        name="noteWords"
        label="What should change"
        rows={4}
        maxLength={NOTE_WORDS_MAX}
        autoFocus
        error={form.fields.words}
      />
      <SelectField
        name="noteSection"
        label="Section"
        value={section}
        onChange={(event) => {
          const next = SECTIONS.find(({ key }) => key === event.target.value);
          if (next) setSection(next.key);
        }}
        options={SECTIONS.map(({ key, title }) => ({ value: key, label: title }))}
        error={form.fields.section}
      />
      {figure === null ? (
        <TextField
          name="notePassage"
          label="Words it is about"
          optional
          hint="Choose them in the text before, or type them as they stand there. Empty means the whole section."
          value={passage}
          maxLength={PASSAGE_MAX}
          onChange={(event) => setPassage(event.target.value)}
          error={form.fields.passage}
        />
      ) : (
        <p className="text-13 text-ink-2">About the figure of {figure}</p>
      )}
      <span className="grid grid-cols-2 gap-2">
        <SelectField
          name="noteKind"
          label="Kind"
          defaultValue="unclear"
          options={NOTE_KINDS.map((kind) => ({ value: kind, label: NOTE_KIND_NAMES[kind] }))}
        />
        <SelectField
          name="noteSeverity"
          label="Weight"
          defaultValue="major"
          options={NOTE_SEVERITIES.map((severity) => ({
            value: severity,
            label: NOTE_SEVERITY_NAMES[severity],
          }))}
        />
      </span>
      <span className="flex gap-2">
        <Button small onClick={onClose}>
          Not now
        </Button>
        <Button small look="primary" type="submit" disabled={form.isBusy}>
          Leave the note
        </Button>
      </span>
    </form>
  );
}
