import { z } from "zod";
import { traverseContent, type TraverseContent } from "@/lib/traverses/schemas";

/** What was typed and not saved yet, kept on this device. */
export type KeptDraft = { seenVersion: number; content: TraverseContent; keptAt: string };

const keptDraft = z.object({
  seenVersion: z.number(),
  content: traverseContent,
  keptAt: z.string(),
});
const keyOf = (traverseId: string) => `riverline.traverse.${traverseId}`;

/** False where the device has no room; the page then says so. */
export function keepDraft(traverseId: string, draft: KeptDraft): boolean {
  try {
    localStorage.setItem(keyOf(traverseId), JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

/** Null where nothing was kept, or what was kept is of an older form of the page. */
export function readDraft(traverseId: string): KeptDraft | null {
  const text = localStorage.getItem(keyOf(traverseId));
  if (text === null) return null;
  try {
    const read = keptDraft.safeParse(JSON.parse(text));
    return read.success ? read.data : null;
  } catch {
    return null;
  }
}

export function dropDraft(traverseId: string): void {
  localStorage.removeItem(keyOf(traverseId));
}
