import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { transaction } from "@/db/transaction";
import { people } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { hashPassword } from "@/lib/auth/password";
import { startSignIn } from "@/lib/auth/sign-ins";
import { documentDigest } from "@/lib/cases/gates";
import { registerItem } from "@/lib/evidence/register-item";
import { createFirstIssue } from "@/lib/findings/create-issue";
import { type DocumentNode, SECTION_HEADING } from "@/lib/findings/document";
import { findIssue } from "@/lib/findings/find-issue";
import { recordReading } from "@/lib/findings/record-reading";
import { saveFindings } from "@/lib/findings/save-findings";
import { SECTIONS } from "@/lib/findings/sections";
import { sendForSignOff } from "@/lib/findings/send-for-sign-off";
import { sendToSecondReader } from "@/lib/findings/send-to-second-reader";
import { weighMechanism } from "@/lib/mechanisms/weigh-mechanism";
import { stateStrength } from "@/lib/strength/state-strength";
import { aCase } from "./cases";
import { asInvestigator, asLead, asSecondInvestigator, asTechnician } from "./people";

export const PASSWORD = "a long pass phrase";
export const ROOT_CAUSE = "Bending fatigue from the fillet of the journal.";

/** A document with every section and these words in the first. */
export function aDocument(words: string): DocumentNode {
  return {
    type: "doc",
    content: SECTIONS.flatMap(({ key, title }, i) => [
      { type: SECTION_HEADING, attrs: { key, title } },
      i === 0
        ? { type: "paragraph", content: [{ type: "text", text: words }] }
        : { type: "paragraph" },
    ]),
  };
}

/** A case with all it needs but the text read, in state `analysing`. */
export async function aWrittenCase(): Promise<string> {
  const [investigator, technician] = await Promise.all([asInvestigator(), asTechnician()]);
  const caseId = await aCase({ state: "analysing" });
  await registerItem(technician, {
    caseId,
    kind: "part",
    parentId: null,
    content: {
      name: "Shaft half",
      description: "",
      condition: ["dry"],
      hazards: [],
      massG: null,
      seal: "40001",
    },
    fromPlace: "The client",
    toPlace: "Store B1",
    reason: "By carrier, box whole.",
    at: new Date().toISOString(),
  });
  await weighMechanism(investigator, {
    caseId,
    recordId: null,
    seenVersion: null,
    content: {
      code: "HC",
      detail: "at the fillet",
      verdict: "stands",
      reason: "Beach marks run from the fillet.",
    },
  });
  await stateStrength(investigator, {
    caseId,
    verdict: "not_applicable",
    reason: "Its strength was not in question.",
    seenVersion: null,
  });
  await transaction((tx) => createFirstIssue(tx, investigator, caseId));
  await write(investigator, caseId, "The shaft broke by fatigue.");
  return caseId;
}

export async function write(actor: Actor, caseId: string, words: string): Promise<void> {
  const issue = await theIssue(caseId);
  await saveFindings(actor, {
    caseId,
    revision: issue.revision,
    document: aDocument(words),
    rootCause: ROOT_CAUSE,
  });
}

export async function theIssue(caseId: string) {
  const issue = await findIssue(database(), caseId);
  if (!issue) throw new Error(`case ${caseId} has no issue`);
  return issue;
}

/** Sends the text to the second reader, who passes it. */
export async function haveRead(caseId: string): Promise<void> {
  const [investigator, reader] = await Promise.all([asInvestigator(), asSecondInvestigator()]);
  await sendToSecondReader(investigator, { caseId, readerId: reader.id });
  const { revision } = await theIssue(caseId);
  await recordReading(reader, { caseId, verdict: "read", note: "Holds.", revision });
}

/** A case that waits for the signature, with every gate met. */
export async function aSignableCase(): Promise<string> {
  const caseId = await aWrittenCase();
  await haveRead(caseId);
  await sendForSignOff(await asInvestigator(), { caseId });
  return caseId;
}

/** A lead engineer with a password, and a sign-in of theirs. */
export async function signedIn(lead: Actor): Promise<{ lead: Actor; signInId: string }> {
  await database()
    .update(people)
    .set({ passwordHash: await hashPassword(PASSWORD) })
    .where(eq(people.id, lead.id));
  const [row] = await database().select().from(people).where(eq(people.id, lead.id));
  const signInId = await startSignIn({ id: lead.id, signInEpoch: row?.signInEpoch ?? 1 });
  return { lead, signInId };
}

/** The lead engineer of the cases, signed in. */
export const leadSignedIn = async () => signedIn(await asLead());

/** What the signing dialogue sends for the text as it stands. */
export async function signature(caseId: string, password = PASSWORD) {
  const { document } = await theIssue(caseId);
  return {
    caseId,
    documentSha256: documentDigest(document),
    hasRead: true,
    hasNotMeasured: true,
    password,
  };
}
