import { z } from "zod";
import { findingsDocument } from "@/lib/findings/document-schema";

/** What is saved of the findings as they are typed. */
export type Draft = { document: unknown; rootCause: string };

const draft = z.object({ document: findingsDocument, rootCause: z.string() });

/** Findings as this device kept them; null where they are of an older form. */
export function parseDraft(kept: unknown): Draft | null {
  const read = draft.safeParse(kept);
  return read.success ? read.data : null;
}
