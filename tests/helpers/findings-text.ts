import { CITED_VALUE, type DocumentNode } from "@/lib/findings/document";
import { startingDocument } from "@/lib/findings/starting-document";

type Cited = { recordId: string; versionId: string; field: string; text: string; tag: string };

/** A cited value as the editor puts it in. */
export const cite = (value: Cited): DocumentNode => ({
  type: CITED_VALUE,
  attrs: {
    recordId: value.recordId,
    versionId: value.versionId,
    field: value.field,
    text: value.text,
    tag: value.tag,
  },
});

export const words = (...parts: (string | DocumentNode)[]): DocumentNode => ({
  type: "paragraph",
  content: parts.map((part) => (typeof part === "string" ? { type: "text", text: part } : part)),
});

/** The sections of findings with these blocks under the first. */
export function findingsWith(...blocks: DocumentNode[]): DocumentNode {
  const [head, , ...rest] = startingDocument().content ?? [];
  return { type: "doc", content: [...(head ? [head] : []), ...blocks, ...rest] };
}
