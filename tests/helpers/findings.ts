import { transaction } from "@/db/transaction";
import { database } from "@/db/client";
import type { Citable } from "@/lib/findings/citable-values";
import { createFirstIssue } from "@/lib/findings/create-issue";
import { CITED_VALUE, type DocumentNode } from "@/lib/findings/document";
import { findIssue } from "@/lib/findings/find-issue";
import { startingDocument } from "@/lib/findings/starting-document";
import { createRecord, nextLabel } from "@/lib/records/write-version";
import { asLead, asTechnician } from "./people";

/** Opens the first issue of a case, as accepting it does. */
export async function openIssue(caseId: string) {
  const lead = await asLead();
  await transaction((tx) => createFirstIssue(tx, lead, caseId));
  const issue = await findIssue(database(), caseId);
  if (!issue) throw new Error("no issue was opened");
  return issue;
}

/** Quotes of a depth in mm, as a measurement would write them. */
export const depthQuotes = (text: string) => ({
  caseDepth: {
    label: "Depth at fillet",
    text,
    value: null,
    unit: "mm",
    expandedUncertainty: null,
    source: "measured" as const,
  },
});

/** The least that the gates read of a hardness result. */
const RESULT = {
  traverseId: "rec_none",
  traverseLabel: "T1",
  hasConversions: false,
  tableTitles: [],
  unsettled: [],
};

/** A record of a case that a text can cite. */
export async function aQuotedRecord(caseId: string, text = "1.94 ± 0.05 mm") {
  const technician = await asTechnician();
  return transaction(async (tx) =>
    createRecord(
      tx,
      technician,
      { caseId, kind: "hardness_result", label: await nextLabel(tx, caseId, "T") },
      { content: RESULT, quotes: depthQuotes(text) },
    ),
  );
}

/** A cited value as the editor puts it in. */
export const cite = (
  value: Pick<Citable, "recordId" | "versionId" | "field" | "text" | "tag">,
): DocumentNode => ({
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
