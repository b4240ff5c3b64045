"use client";

import { useEffect, useEffectEvent } from "react";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { dropDraft, readDraft } from "./kept-draft";

/** Hands over, once, what this device kept of a traverse and never saved. */
export function useKeptDraft(
  traverseId: string,
  isReadOnly: boolean,
  onFound: (draft: { content: TraverseContent; isOld: boolean }) => void,
  version: number,
  stored: TraverseContent,
) {
  const found = useEffectEvent(() => {
    if (isReadOnly) return;
    const kept = readDraft(traverseId);
    if (!kept) return;
    if (JSON.stringify(kept.content) === JSON.stringify(stored)) dropDraft(traverseId);
    else onFound({ content: kept.content, isOld: kept.seenVersion !== version });
  });
  useEffect(() => found(), [traverseId]);
}
