"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextAreaField } from "@/components/ui/labelled-fields";
import { ask, cancel, decline } from "../actions";

const KINDS = {
  ask: {
    title: "Ask the requester",
    act: "Send the question",
    label: "Question",
    says: "The case waits until it is answered. The requester gets a mail.",
    look: "primary",
    open: "Ask a question",
  },
  decline: {
    title: "Decline the case?",
    act: "Decline the case",
    label: "Why",
    says: "The requester reads the reason. The parts go back.",
    look: "danger",
    open: "Decline",
  },
  cancel: {
    title: "Cancel the request?",
    act: "Cancel the request",
    label: "Why",
    says: "It ends here and stays readable.",
    look: "danger",
    open: "Cancel the request",
  },
} as const;

/** Asks, declines or cancels, each with words that the other side reads. */
export function ReasonDialog({ caseId, kind }: { caseId: string; kind: keyof typeof KINDS }) {
  const form = useActionForm<void>();
  const [isOpen, setOpen] = useState(false);
  const words = KINDS[kind];
  const id = `${kind}-form`;
  function send(text: string) {
    form.send(
      () =>
        kind === "ask"
          ? ask({ caseId, questions: [text] })
          : kind === "decline"
            ? decline({ caseId, reason: text })
            : cancel({ caseId, reason: text }),
      () => setOpen(false),
    );
  }
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      keepOpenOutside
      title={words.title}
      description={words.says}
      trigger={<Button>{words.open}</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not now</Button>
          <Button type="submit" form={id} look={words.look} disabled={form.isBusy}>
            {words.act}
          </Button>
        </>
      }
    >
      <form
        id={id}
        onSubmit={(event) => {
          event.preventDefault();
          send(String(new FormData(event.currentTarget).get(`${kind}-words`) ?? ""));
        }}
      >
        <TextAreaField
          name={`${kind}-words`}
          label={words.label}
          rows={4}
          required
          error={form.fields.reason ?? form.fields["questions.0"] ?? form.failure}
        />
      </form>
    </Dialog>
  );
}
