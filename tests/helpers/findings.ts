import { transaction } from "@/db/transaction";
import { database } from "@/db/client";
import { createFirstIssue } from "@/lib/findings/create-issue";
import { findIssue } from "@/lib/findings/find-issue";
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
