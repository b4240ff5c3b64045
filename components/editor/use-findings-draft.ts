"use client";

import { useCallback, useRef, useState } from "react";
import { type KeptDraft, newestDraft, useDraftSaving } from "@/components/forms/use-draft-saving";
import { useSetAside } from "@/components/forms/use-set-aside";
import { routes } from "@/lib/routes";
import { type Draft, parseDraft } from "./draft";
import type { CitedState } from "./use-sources";

type SavedFindings = { revision: number; savedAt: string; cited: CitedState[] };
type Options = {
  caseId: string;
  issueNumber: number;
  revision: number;
  savedAt: string | null;
  document: unknown;
  rootCause: string;
  isReadOnly: boolean;
  onSaved: (cited: CitedState[]) => void;
};

/**
 * The text as it stands on this page: root cause and document, how far they are saved, and what
 * this device keeps beside them. `show` puts a whole document on screen.
 */
export function useFindingsDraft(options: Options, show: (document: unknown) => void) {
  const { onSaved } = options;
  const storageKey = `riverline.findings.${options.caseId}.${options.issueNumber}`;
  const [start] = useState(() => {
    const { revision, savedAt, document, rootCause } = options;
    return newestDraft<Draft>(
      storageKey,
      { revision, savedAt, draft: { document, rootCause } },
      parseDraft,
    );
  });
  const [rootCause, setRootCause] = useState(start.draft.rootCause);
  // Counts changes since the last saved state; what stands beside the text follows it.
  const [changes, setChanges] = useState(0);
  const draft = useRef<Draft>(start.draft);
  const saving = useDraftSaving<Draft, SavedFindings>({
    url: routes.api.findings(options.caseId),
    storageKey,
    revision: start.revision,
    savedAt: start.savedAt,
    read: useCallback(() => draft.current, []),
    onSaved: useCallback(
      (saved: SavedFindings) => {
        onSaved(saved.cited);
        setChanges(0);
      },
      [onSaved],
    ),
  });
  const { changed, state } = saving;
  const { aside, add, forget } = useSetAside<Draft>({
    storageKey,
    parse: parseDraft,
    stored: start.draft,
    isOff: options.isReadOnly,
  });

  const write = useCallback(
    (part: Partial<Draft>) => {
      draft.current = { ...draft.current, ...part };
      if (part.rootCause !== undefined) setRootCause(part.rootCause);
      setChanges((n) => n + 1);
      changed();
    },
    [changed],
  );

  function replace({ document, rootCause: cause }: Draft) {
    draft.current = { document, rootCause: cause };
    setRootCause(cause);
    show(document);
    setChanges((n) => n + 1);
  }

  function putBack(kept: KeptDraft<Draft>) {
    if (state.kind === "saved") forget(kept);
    else add(draft.current, saving.revisionSeen(), kept);
    replace(kept.draft);
    // Goes on from what it was written on: what was saved since then shows beside it.
    saving.yieldTo(kept.revision);
    changed();
    void saving.saveNow();
  }

  function takeTheirs() {
    if (state.kind !== "conflict") return;
    const { theirs } = state.conflict;
    add(draft.current, saving.revisionSeen());
    replace(theirs);
    saving.yieldTo(theirs.revision);
  }

  return {
    /** The document to open the page with. */
    opening: start.draft.document,
    rootCause,
    changes,
    saving,
    aside,
    forget,
    write,
    putBack,
    takeTheirs,
  };
}
