"use client";

import { useCallback, useRef, useState } from "react";
import { type KeptDraft, newestDraft, useDraftSaving } from "@/components/forms/use-draft-saving";
import { useSetAside } from "@/components/forms/use-set-aside";
import type { Answer, Answers } from "@/lib/intake/answers";
import { checkAnswer, checkForSending, type Problems } from "@/lib/intake/check-answers";
import { fieldByKey, type FieldKey } from "@/lib/intake/fields";
import type { FieldReturnPage } from "@/lib/intake/read-field-return";
import { fieldReturnContent } from "@/lib/intake/schemas";
import { routes } from "@/lib/routes";

export type Draft = { answers: Answers };

function parseDraft(kept: unknown): Draft | null {
  const read = fieldReturnContent.safeParse(kept);
  return read.success ? read.data : null;
}

/** Answers as they stand on this page, what is wrong with them, and how far they are saved. */
export function useAnswers(page: FieldReturnPage) {
  const storageKey = `riverline.field-return.${page.caseId}`;
  const [start] = useState(() => {
    const { revision, savedAt, answers } = page;
    return newestDraft<Draft>(storageKey, { revision, savedAt, draft: { answers } }, parseDraft);
  });
  const [answers, setAnswers] = useState(start.draft.answers);
  const [problems, setProblems] = useState<Problems>({});
  // Counts changes since the last saved state.
  const [changes, setChanges] = useState(0);
  const draft = useRef<Draft>(start.draft);
  const saving = useDraftSaving<Draft, { revision: number; savedAt: string }>({
    url: routes.api.fieldReturnDraft(page.caseId),
    storageKey,
    revision: start.revision,
    savedAt: start.savedAt,
    read: useCallback(() => draft.current, []),
    onSaved: useCallback(() => setChanges(0), []),
  });
  const { changed, state } = saving;
  const { aside, add, forget } = useSetAside<Draft>({
    storageKey,
    parse: parseDraft,
    stored: start.draft,
  });

  const replace = useCallback((next: Answers) => {
    draft.current = { answers: next };
    setAnswers(next);
  }, []);
  const check = useCallback(
    (key: FieldKey) =>
      setProblems((now) => ({
        ...now,
        [key]: checkAnswer(fieldByKey(key), draft.current.answers) ?? undefined,
      })),
    [],
  );

  const answer = useCallback(
    (key: FieldKey, given: Answer) => {
      replace({ ...draft.current.answers, [key]: given });
      setProblems((now) =>
        now[key]
          ? { ...now, [key]: checkAnswer(fieldByKey(key), draft.current.answers) ?? undefined }
          : now,
      );
      setChanges((n) => n + 1);
      changed();
    },
    [changed, replace],
  );

  /** Checks everything at once; true when it can be sent. */
  function checkAll(): boolean {
    const found = checkForSending(draft.current.answers, new Date());
    setProblems(found);
    return Object.keys(found).length === 0;
  }

  function putBack(kept: KeptDraft<Draft>) {
    if (state.kind === "saved") forget(kept);
    else add(draft.current, saving.revisionSeen(), kept);
    replace(kept.draft.answers);
    // Goes on from what they were written on: what was saved since then shows beside them.
    saving.yieldTo(kept.revision);
    changed();
    void saving.saveNow();
  }

  function takeTheirs() {
    if (state.kind !== "conflict") return;
    const { theirs } = state.conflict;
    add(draft.current, saving.revisionSeen());
    replace(theirs.answers);
    saving.yieldTo(theirs.revision);
  }

  return {
    answers,
    problems,
    changes,
    saving,
    aside,
    forget,
    answer,
    check,
    checkAll,
    putBack,
    takeTheirs,
  };
}
