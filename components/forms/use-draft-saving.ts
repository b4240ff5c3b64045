"use client";

import { useCallback, useEffect, useRef, useState } from "react";

/** Two states of a draft of kind `D`, when two people saved. */
export type DraftConflict<D> = {
  yours: D;
  theirs: D & { revision: number };
  changedBy: string;
  changedAt: string;
};
export type SavingState<D> =
  | { kind: "saved"; at: string | null }
  | { kind: "waiting" }
  | { kind: "saving" }
  | { kind: "offline" }
  | { kind: "signed-out" }
  | { kind: "refused"; message: string }
  | { kind: "conflict"; conflict: DraftConflict<D> };

type Saved = { revision: number; savedAt: string };
export type KeptDraft<D> = { revision: number; at: string } & D;

const SAVE_AFTER_MS = 1_500;
const TRY_AGAIN_MS = 5_000;

/** Saves a draft as it is typed, keeps a copy on the device until the server has it, and tells how it stands. */
export function useDraftSaving<D extends object, S extends Saved>(options: {
  /** Takes PUT with the revision seen and the draft. */
  url: string;
  storageKey: string;
  revision: number;
  savedAt: string | null;
  read: () => D;
  onSaved?: (saved: S) => void;
}) {
  const { url, storageKey, read, onSaved } = options;
  const revision = useRef(options.revision);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const isSending = useRef(false);
  const isDirty = useRef(false);
  const sender = useRef<() => Promise<void>>(() => Promise.resolve());
  const [state, setState] = useState<SavingState<D>>({ kind: "saved", at: options.savedAt });

  const send = useCallback(async () => {
    if (isSending.current || !isDirty.current) return;
    isSending.current = true;
    isDirty.current = false;
    const draft = read();
    setState({ kind: "saving" });
    const again = () => {
      isDirty.current = true;
      timer.current = setTimeout(() => void sender.current(), TRY_AGAIN_MS);
    };
    try {
      const answer = await fetch(url, {
        method: "PUT",
        headers: { "content-type": "application/json" },
        body: JSON.stringify({ ...draft, revision: revision.current }),
      });
      if (answer.ok) {
        const saved: S = await answer.json();
        revision.current = saved.revision;
        onSaved?.(saved);
        if (!isDirty.current) {
          localStorage.removeItem(storageKey);
          setState({ kind: "saved", at: saved.savedAt });
        }
      } else {
        const { error } = await answer.json();
        if (answer.status === 409 && error.conflict)
          setState({ kind: "conflict", conflict: error.conflict });
        else if (answer.status === 401) setState({ kind: "signed-out" });
        else if (answer.status >= 500) {
          setState({ kind: "offline" });
          again();
        } else setState({ kind: "refused", message: error.message });
      }
    } catch {
      // No connection: the copy on the device stays, and sending is tried again.
      setState({ kind: "offline" });
      again();
    } finally {
      isSending.current = false;
      if (isDirty.current && timer.current === undefined)
        timer.current = setTimeout(() => void sender.current(), SAVE_AFTER_MS);
    }
  }, [onSaved, read, storageKey, url]);

  useEffect(() => {
    sender.current = send;
  }, [send]);

  const changed = useCallback(() => {
    isDirty.current = true;
    const kept: KeptDraft<D> = {
      ...read(),
      revision: revision.current,
      at: new Date().toISOString(),
    };
    localStorage.setItem(storageKey, JSON.stringify(kept));
    setState((now) =>
      now.kind === "conflict" || now.kind === "signed-out" ? now : { kind: "waiting" },
    );
    clearTimeout(timer.current);
    timer.current = setTimeout(() => {
      timer.current = undefined;
      void sender.current();
    }, SAVE_AFTER_MS);
  }, [read, storageKey]);

  const saveNow = useCallback(() => {
    clearTimeout(timer.current);
    timer.current = undefined;
    void sender.current();
  }, []);

  /** Goes on from the other person's revision, with one's own text. */
  const overrule = useCallback((theirRevision: number) => {
    revision.current = theirRevision;
    isDirty.current = true;
    void sender.current();
  }, []);

  /** Takes the other person's text; there is nothing of one's own left to save. */
  const yieldTo = useCallback(
    (theirRevision: number) => {
      revision.current = theirRevision;
      isDirty.current = false;
      localStorage.removeItem(storageKey);
      setState({ kind: "saved", at: null });
    },
    [storageKey],
  );

  useEffect(() => {
    const warn = (event: BeforeUnloadEvent) => {
      if (isDirty.current || isSending.current) event.preventDefault();
    };
    const online = () => saveNow();
    window.addEventListener("beforeunload", warn);
    window.addEventListener("online", online);
    return () => {
      window.removeEventListener("beforeunload", warn);
      window.removeEventListener("online", online);
    };
  }, [saveNow]);

  return { state, changed, saveNow, overrule, yieldTo };
}

/** A copy on this device that the server never got; null when there is none. */
export function keptDraft<D>(storageKey: string, member: keyof D & string): KeptDraft<D> | null {
  const text = localStorage.getItem(storageKey);
  if (text === null) return null;
  try {
    const kept: KeptDraft<D> = JSON.parse(text);
    return typeof kept === "object" && kept !== null && member in kept ? kept : null;
  } catch {
    localStorage.removeItem(storageKey);
    return null;
  }
}
