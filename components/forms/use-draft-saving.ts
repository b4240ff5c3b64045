"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import { dropFromDevice, keepOnDevice } from "./device-copy";

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
/** A draft as this device keeps it, and the revision it was written on. */
export type KeptDraft<D> = { revision: number; at: string; draft: D };

/** A draft as the server has it. */
export type StoredDraft<D> = { revision: number; savedAt: string | null; draft: D };

/** What this window saved since it was loaded, by storage key. */
const savedHere = new Map<string, StoredDraft<unknown>>();

/**
 * The draft to start from: a page that comes back from the browser's history is as old as when it
 * was left, and what was saved since is newer.
 */
export function newestDraft<D>(
  storageKey: string,
  loaded: StoredDraft<D>,
  parse: (draft: unknown) => D | null,
): StoredDraft<D> {
  const own = savedHere.get(storageKey);
  const draft = own && own.revision > loaded.revision ? parse(own.draft) : null;
  return own && draft ? { ...own, draft } : loaded;
}

const SAVE_AFTER_MS = 1_500;
const TRY_AGAIN_MS = 5_000;

/** Stays on screen while one types on and while sending is tried again. */
const staysShown = ({ kind }: SavingState<object>) =>
  kind === "offline" || kind === "signed-out" || kind === "conflict";

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
  const seen = useRef(options.revision);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const inFlight = useRef<Promise<void>>(null);
  // Changes made here, and how many of them the server has.
  const typed = useRef(0);
  const stored = useRef(0);
  // Goes up with every choice between two texts: an answer to what was sent before says nothing.
  const choice = useRef(0);
  const isSignedOut = useRef(false);
  const saver = useRef<() => Promise<boolean>>(() => Promise.resolve(false));
  const [state, setState] = useState<SavingState<D>>({ kind: "saved", at: options.savedAt });
  const [keepsCopy, setKeepsCopy] = useState(true);
  const [revision, setRevision] = useState(options.revision);

  const goOnFrom = useCallback((next: number) => {
    seen.current = next;
    setRevision(next);
  }, []);

  const schedule = useCallback((afterMs: number) => {
    clearTimeout(timer.current);
    timer.current = setTimeout(() => void saver.current(), afterMs);
  }, []);

  const send = useCallback(async () => {
    const [sent, chosen, draft] = [typed.current, choice.current, read()];
    setState((now) => (staysShown(now) ? now : { kind: "saving" }));
    const noAnswer = () => {
      setState({ kind: "offline" });
      schedule(TRY_AGAIN_MS);
    };
    try {
      const answer = await fetch(url, {
        method: "PUT",
        headers: { "content-type": "application/json" },
        body: JSON.stringify({ ...draft, revision: seen.current }),
      });
      const body = await answer.json();
      isSignedOut.current = answer.status === 401;
      if (chosen !== choice.current) return;
      if (answer.ok) {
        const saved: S = body;
        goOnFrom(saved.revision);
        stored.current = sent;
        savedHere.set(storageKey, { revision: saved.revision, savedAt: saved.savedAt, draft });
        onSaved?.(saved);
        if (typed.current === sent) {
          dropFromDevice(storageKey);
          setState({ kind: "saved", at: saved.savedAt });
        } else {
          setState({ kind: "waiting" });
          schedule(SAVE_AFTER_MS);
        }
      } else if (answer.status === 409 && body.error.conflict)
        setState({ kind: "conflict", conflict: body.error.conflict });
      else if (answer.status === 401) setState({ kind: "signed-out" });
      else if (answer.status >= 500) noAnswer();
      else setState({ kind: "refused", message: body.error.message });
    } catch {
      // No connection, or an answer that is not the portal's: what is here stays, and is sent again.
      noAnswer();
    }
  }, [goOnFrom, onSaved, read, schedule, storageKey, url]);

  /** Sends what the server has not got, at once; answers whether it now has everything. */
  const saveNow = useCallback(async (): Promise<boolean> => {
    clearTimeout(timer.current);
    while (inFlight.current) await inFlight.current;
    if (typed.current !== stored.current) {
      inFlight.current = send().finally(() => {
        inFlight.current = null;
      });
      await inFlight.current;
    }
    return typed.current === stored.current;
  }, [send]);

  useEffect(() => {
    saver.current = saveNow;
  }, [saveNow]);

  const changed = useCallback(() => {
    typed.current += 1;
    const kept: KeptDraft<D> = {
      revision: seen.current,
      at: new Date().toISOString(),
      draft: read(),
    };
    setKeepsCopy(keepOnDevice(storageKey, kept));
    setState((now) => (staysShown(now) ? now : { kind: "waiting" }));
    schedule(SAVE_AFTER_MS);
  }, [read, schedule, storageKey]);

  /** Goes on from the other person's revision, with one's own text. */
  const overrule = useCallback(
    (theirRevision: number) => {
      choice.current += 1;
      goOnFrom(theirRevision);
      typed.current += 1;
      setState({ kind: "saving" });
      void saver.current();
    },
    [goOnFrom],
  );

  /** Goes on from a text of another revision; there is nothing of one's own left to save. */
  const yieldTo = useCallback(
    (otherRevision: number) => {
      choice.current += 1;
      clearTimeout(timer.current);
      goOnFrom(otherRevision);
      stored.current = typed.current;
      dropFromDevice(storageKey);
      setState({ kind: "saved", at: null });
    },
    [goOnFrom, storageKey],
  );

  /** Revision of the text that what stands here goes on from. */
  const revisionSeen = useCallback(() => seen.current, []);

  useEffect(() => {
    const warn = (event: BeforeUnloadEvent) => {
      if (typed.current !== stored.current) event.preventDefault();
    };
    const online = () => void saver.current();
    // Back from signing in in another window.
    const back = () => {
      if (isSignedOut.current) void saver.current();
    };
    window.addEventListener("beforeunload", warn);
    window.addEventListener("online", online);
    window.addEventListener("focus", back);
    return () => {
      window.removeEventListener("beforeunload", warn);
      window.removeEventListener("online", online);
      window.removeEventListener("focus", back);
      // On to another page of the portal: what was typed last goes along.
      void saver.current();
    };
  }, []);

  return { state, keepsCopy, revision, revisionSeen, changed, saveNow, overrule, yieldTo };
}
