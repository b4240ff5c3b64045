"use client";

import { useRouter } from "next/navigation";
import { useCallback, useEffect, useRef, useState } from "react";
import { useOnline } from "@/components/frame/use-online";
import type { Conflict, FieldErrors } from "@/lib/errors";
import { traverseContent, type TraverseContent } from "@/lib/traverses/schemas";
import { dropDraft, keepDraft, type KeptDraft } from "./kept-draft";

export type SaveAnswer =
  | { ok: true; value: { version: number } }
  | {
      ok: false;
      error: { code: string; message: string; fields?: FieldErrors; conflict?: Conflict };
    };
export type SaveTraverse = (seenVersion: number, content: TraverseContent) => Promise<SaveAnswer>;

export type TheirVersion = { content: TraverseContent; by: string; at: string };
export type SaveState =
  | { kind: "saved"; at: string }
  | { kind: "unsaved" }
  | { kind: "saving" }
  | { kind: "offline" }
  | { kind: "failed"; message: string; fields: FieldErrors }
  | { kind: "conflict"; message: string; theirs: TheirVersion };

const AFTER_LAST_CHANGE_MS = 1500;
/** Between tries while nothing answers. */
const TRY_AGAIN_MS = 5000;

/**
 * Saves 1.5 s after the last change, one save at a time, and keeps what is not saved on the device.
 * After a conflict it waits until the person has chosen.
 */
export function useAutosave({
  traverseId,
  version,
  savedAt,
  content,
  save,
  isReadOnly,
}: {
  traverseId: string;
  version: number;
  savedAt: string;
  /** Content as it would be saved; the same object while nothing changes. */
  content: TraverseContent;
  save: SaveTraverse;
  isReadOnly: boolean;
}) {
  const [state, setState] = useState<SaveState>({ kind: "saved", at: savedAt });
  const [seenVersion, setSeenVersion] = useState(version);
  const [saved, setSaved] = useState(content);
  const [keepsCopy, setKeepsCopy] = useState(true);
  const isOnline = useOnline();
  const router = useRouter();
  const latest = useRef(content);
  const isBusy = useRef(false);
  useEffect(() => {
    latest.current = content;
  }, [content]);

  const isChanged = content !== saved;

  const send = useCallback(
    async (seen: number) => {
      if (isBusy.current) return;
      isBusy.current = true;
      const sent = latest.current;
      setState({ kind: "saving" });
      try {
        const answer = await save(seen, sent);
        if (answer.ok) {
          setSeenVersion(answer.value.version);
          setSaved(sent);
          setState({ kind: "saved", at: new Date().toISOString() });
          if (latest.current === sent) dropDraft(traverseId);
        } else if (answer.error.conflict) {
          const { theirs, changedBy, changedAt } = answer.error.conflict;
          // Brings the number of the version that now stands.
          router.refresh();
          setState({
            kind: "conflict",
            message: answer.error.message,
            theirs: { content: traverseContent.parse(theirs), by: changedBy, at: changedAt },
          });
        } else {
          const { message, fields = {} } = answer.error;
          setState({ kind: "failed", message, fields });
        }
      } catch {
        // No answer: the connection is gone. What was typed is kept on the device.
        setState({ kind: "offline" });
      } finally {
        isBusy.current = false;
      }
    },
    [router, save, traverseId],
  );

  const isConflict = state.kind === "conflict";
  const afterMs = state.kind === "offline" ? TRY_AGAIN_MS : AFTER_LAST_CHANGE_MS;
  useEffect(() => {
    if (isReadOnly || !isChanged || isConflict) return;
    const timer = setTimeout(() => {
      setKeepsCopy(
        keepDraft(traverseId, { seenVersion, content, keptAt: new Date().toISOString() }),
      );
      if (isOnline) void send(seenVersion);
      else setState({ kind: "offline" });
    }, afterMs);
    return () => clearTimeout(timer);
  }, [
    afterMs,
    content,
    isChanged,
    isConflict,
    isOnline,
    isReadOnly,
    seenVersion,
    send,
    traverseId,
  ]);

  const unsaved = useRef<KeptDraft | null>(null);
  useEffect(() => {
    unsaved.current = isChanged ? { seenVersion, content, keptAt: new Date().toISOString() } : null;
  }, [content, isChanged, seenVersion]);
  useEffect(() => {
    const keep = () => {
      if (unsaved.current) keepDraft(traverseId, unsaved.current);
    };
    window.addEventListener("pagehide", keep);
    return () => {
      window.removeEventListener("pagehide", keep);
      keep();
    };
  }, [traverseId]);

  return {
    keepsCopy,
    state: isChanged && state.kind === "saved" ? ({ kind: "unsaved" } as const) : state,
    retry: () => void send(seenVersion),
    /** Saves these rows over the version the other person wrote. */
    keepMine: () => void send(version),
    /** The other person's version stands; the caller shows it. */
    takeTheirs: () => {
      setSeenVersion(version);
      setState({ kind: "saved", at: new Date().toISOString() });
      dropDraft(traverseId);
    },
    openConflict: (theirs: TheirVersion, message: string) =>
      setState({ kind: "conflict", message, theirs }),
  };
}
