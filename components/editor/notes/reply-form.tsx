"use client";

import { type Answer, useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { TextAreaField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { NOTE_WORDS_MAX } from "@/lib/findings/constants";

type Props = {
  id: string;
  label: string;
  actLabel: string;
  send: (words: string) => Promise<Answer<unknown>>;
  onClose: () => void;
};

/** Words to one note. */
export function ReplyForm({ id, label, actLabel, send, onClose }: Props) {
  const form = useActionForm<unknown>();
  return (
    <form
      className="grid gap-2"
      onSubmit={(event) => {
        event.preventDefault();
        const words = String(new FormData(event.currentTarget).get("words") ?? "");
        form.send(() => send(words), onClose);
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="Nothing was recorded." live="assertive">
          {form.failure}
        </Notice>
      )}
      <TextAreaField
        name="words"
        id={`reply-${id}`}
        label={label}
        rows={3}
        maxLength={NOTE_WORDS_MAX}
        autoFocus
        error={form.fields.words}
      />
      <span className="flex gap-2">
        <Button small onClick={onClose}>
          Not now
        </Button>
        <Button small look="primary" type="submit" disabled={form.isBusy}>
          {actLabel}
        </Button>
      </span>
    </form>
  );
}
