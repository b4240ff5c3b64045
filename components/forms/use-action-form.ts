"use client";

import { useState, useTransition } from "react";
import type { FieldErrors } from "@/lib/errors";

/** Answer of a server action as forms see it. */
export type Answer<T> =
  { ok: true; value: T } | { ok: false; error: { message: string; fields?: FieldErrors } };

export type ActionForm<T> = {
  isBusy: boolean;
  /** Said above the form; null while there is nothing to say. */
  failure: string | null;
  fields: FieldErrors;
  send: (work: () => Promise<Answer<T>>, done: (value: T) => void) => void;
};

const NO_ANSWER =
  "There was no answer. Nothing was changed, and what you typed is kept. Try again.";

/** Runs an action from a form, keeps what was typed, and shows what went wrong in place. */
export function useActionForm<T>(): ActionForm<T> {
  const [isBusy, start] = useTransition();
  const [failure, setFailure] = useState<string | null>(null);
  const [fields, setFields] = useState<FieldErrors>({});
  return {
    isBusy,
    failure,
    fields,
    send(work, done) {
      start(async () => {
        setFailure(null);
        setFields({});
        let answer: Answer<T>;
        try {
          answer = await work();
        } catch {
          setFailure(NO_ANSWER);
          return;
        }
        if (answer.ok) {
          done(answer.value);
          return;
        }
        setFailure(answer.error.message);
        setFields(answer.error.fields ?? {});
      });
    },
  };
}
