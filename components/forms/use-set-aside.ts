"use client";

import { useCallback, useEffect, useEffectEvent, useState } from "react";
import { z } from "zod";
import { dropFromDevice, keepOnDevice, readFromDevice } from "./device-copy";
import type { KeptDraft } from "./use-draft-saving";

const envelope = z.object({ revision: z.number(), at: z.string(), draft: z.unknown() });

/**
 * Drafts that stand beside the one being written: what this device kept and the server never got,
 * and one's own text after the other person's was taken. Nothing typed later writes over them.
 */
export function useSetAside<D extends object>(options: {
  storageKey: string;
  /** The draft in what was kept, or null where it is of an older form of the page. */
  parse: (kept: unknown) => D | null;
  /** What the server has; the same kept here is not worth showing. */
  stored: D;
  isOff?: boolean;
}) {
  const { storageKey } = options;
  const asideKey = `${storageKey}.aside`;
  const [aside, setAside] = useState<readonly KeptDraft<D>[]>([]);

  const find = useEffectEvent((): KeptDraft<D>[] => {
    const earlier = readFromDevice(asideKey);
    const unsaved = readFromDevice(storageKey);
    const found = [...(Array.isArray(earlier) ? earlier : []), unsaved].flatMap((kept) => {
      const read = envelope.safeParse(kept);
      const draft = read.success ? options.parse(read.data.draft) : null;
      return read.success && draft ? [{ ...read.data, draft }] : [];
    });
    const told = found.filter(
      ({ draft }) => JSON.stringify(draft) !== JSON.stringify(options.stored),
    );
    if (unsaved !== null && keepOnDevice(asideKey, told)) dropFromDevice(storageKey);
    return told;
  });
  useEffect(() => {
    if (options.isOff) return;
    // Read once after the page is there: the server cannot know what this device keeps.
    queueMicrotask(() => setAside(find()));
  }, [storageKey, options.isOff]);

  const write = useCallback(
    (next: readonly KeptDraft<D>[]) => {
      if (next.length === 0) dropFromDevice(asideKey);
      else keepOnDevice(asideKey, next);
      setAside(next);
    },
    [asideKey],
  );
  return {
    aside,
    forget: (kept: KeptDraft<D>) => write(aside.filter((other) => other !== kept)),
    /** Sets a draft aside; with `instead`, in the place of one that is put back. */
    add: (draft: D, revision: number, instead?: KeptDraft<D>) =>
      write([
        ...aside.filter((other) => other !== instead),
        { revision, at: new Date().toISOString(), draft },
      ]),
  };
}
