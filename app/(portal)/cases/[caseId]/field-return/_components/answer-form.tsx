"use client";

import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { TextAreaField } from "@/components/ui/labelled-fields";
import { ANSWER_MAX } from "@/lib/cases/schemas";
import { sendAnswer } from "../actions";

type Props = { caseId: string; question: { id: string; question: string; askedBy: string } };

/** One open question of the laboratory, and the place for its answer. */
export function AnswerForm({ caseId, question }: Props) {
  const form = useActionForm<{ stillOpen: number }>();
  const name = `answer-${question.id}`;
  return (
    <form
      className="grid gap-2 rounded-4 border border-l-3 border-warn-mark bg-surface p-4"
      onSubmit={(event) => {
        event.preventDefault();
        const answer = String(new FormData(event.currentTarget).get(name) ?? "");
        form.send(
          () => sendAnswer({ caseId, questionId: question.id, answer }),
          () => undefined,
        );
      }}
    >
      <TextAreaField
        name={name}
        label={`${question.askedBy} asks: ${question.question}`}
        rows={3}
        required
        maxLength={ANSWER_MAX}
        error={form.fields.answer ?? form.failure}
      />
      <p>
        <Button type="submit" look="primary" disabled={form.isBusy}>
          Send the answer
        </Button>
      </p>
    </form>
  );
}
