import { z } from "zod";
import { dropFromDevice, keepOnDevice, readFromDevice } from "@/components/forms/device-copy";
import { traverseContent, type TraverseContent } from "@/lib/traverses/schemas";

/** What was typed and not saved yet, kept on this device. */
export type KeptDraft = { seenVersion: number; content: TraverseContent; keptAt: string };

const keptDraft = z.object({
  seenVersion: z.number(),
  content: traverseContent,
  keptAt: z.string(),
});
const keyOf = (traverseId: string) => `riverline.traverse.${traverseId}`;

/** False where the browser keeps no copy; the page then says so. */
export function keepDraft(traverseId: string, draft: KeptDraft): boolean {
  return keepOnDevice(keyOf(traverseId), draft);
}

/** Null where nothing was kept, or what was kept is of an older form of the page. */
export function readDraft(traverseId: string): KeptDraft | null {
  const read = keptDraft.safeParse(readFromDevice(keyOf(traverseId)));
  return read.success ? read.data : null;
}

export function dropDraft(traverseId: string): void {
  dropFromDevice(keyOf(traverseId));
}
