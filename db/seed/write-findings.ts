import { database } from "@/db/client";
import type { Actor } from "@/lib/auth/actor";
import { type Citable, citableValues } from "@/lib/findings/citable-values";
import {
  CHART_FIGURE,
  CITED_VALUE,
  type DocumentNode,
  FIGURE,
  SECTION_HEADING,
} from "@/lib/findings/document";
import { findIssue } from "@/lib/findings/find-issue";
import { saveFindings } from "@/lib/findings/save-findings";
import { type SectionKey, SECTIONS } from "@/lib/findings/sections";

/** A paragraph: words, with values cited by tag and field in between. */
export type Words = (string | { tag: string; field: string })[];
export type Part =
  | Words
  | { list: Words[] }
  | { figure: string; caption: string }
  | { chart: string; caption: string };
export type WrittenSections = Partial<Record<SectionKey, Part[]>>;

function inline(words: Words, citable: readonly Citable[]): DocumentNode[] {
  return words.map((word) => {
    if (typeof word === "string") return { type: "text", text: word };
    const value = citable.find((known) => known.tag === word.tag && known.field === word.field);
    if (!value) throw new Error(`nothing to cite at ${word.tag} ${word.field}`);
    const { recordId, versionId, field, text, tag } = value;
    return { type: CITED_VALUE, attrs: { recordId, versionId, field, text, tag } };
  });
}

function block(part: Part, citable: readonly Citable[]): DocumentNode {
  if (Array.isArray(part)) return { type: "paragraph", content: inline(part, citable) };
  if ("list" in part) {
    return {
      type: "orderedList",
      content: part.list.map((words) => ({
        type: "listItem",
        content: [{ type: "paragraph", content: inline(words, citable) }],
      })),
    };
  }
  return "figure" in part
    ? { type: FIGURE, attrs: { imageId: part.figure, caption: part.caption, withMarks: true } }
    : { type: CHART_FIGURE, attrs: { traverseId: part.chart, caption: part.caption } };
}

/** Writes the findings of a case in their fixed sections and saves them. */
export async function writeFindings(
  writer: Actor,
  caseId: string,
  rootCause: string,
  sections: WrittenSections,
): Promise<void> {
  const citable = await citableValues(database(), caseId);
  const issue = await findIssue(database(), caseId);
  if (!issue) throw new Error(`case ${caseId} has no issue`);
  const document: DocumentNode = {
    type: "doc",
    content: SECTIONS.flatMap(({ key, title }) => [
      { type: SECTION_HEADING, attrs: { key, title } },
      ...(sections[key]?.map((part) => block(part, citable)) ?? [{ type: "paragraph" }]),
    ]),
  };
  await saveFindings(writer, { caseId, revision: issue.revision, document, rootCause });
}
