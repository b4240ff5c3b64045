import "server-only";
import { and, asc, desc, eq, inArray, ne } from "drizzle-orm";
import { database } from "@/db/client";
import { caseMoves, people, records, recordVersions } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { type Action, decide } from "@/lib/auth/policy";
import { documentDigest, type Gate, gateLedger } from "@/lib/cases/gates";
import { getCase } from "@/lib/cases/get-case";
import type { CaseState } from "@/lib/cases/constants";
import { type DocumentNode, plainTextOf } from "@/lib/findings/document";
import { findIssue } from "@/lib/findings/find-issue";
import { readingContent } from "@/lib/findings/reading-schema";
import { LAB_ROLES } from "@/lib/people/constants";

export type SignOffAct = { isOpen: boolean; reason: string | null };
export type SignOffPage = {
  caseId: string;
  caseNumber: string;
  state: CaseState;
  gates: Gate[];
  issue: {
    number: number;
    revision: number;
    rootCause: string;
    documentSha256: string;
    document: DocumentNode;
    hasText: boolean;
    signedAt: string | null;
    releasedAt: string | null;
    fingerprint: string | null;
  } | null;
  reading: {
    by: string;
    at: string;
    verdict: "read" | "sent_back";
    note: string;
    isOfThisText: boolean;
  } | null;
  secondReader: { id: string; name: string } | null;
  readers: { id: string; name: string }[];
  signer: { name: string; roleName: string };
  goesTo: string[];
  lastNote: string | null;
  acts: {
    sendToSecondReader: SignOffAct;
    recordReading: SignOffAct;
    sendForSignOff: SignOffAct;
    sendBack: SignOffAct;
    sign: SignOffAct;
    openNewIssue: SignOffAct;
  };
};

/** Everything the sign-off page shows to this person. */
export async function readSignOff(
  actor: Actor,
  caseId: string,
  roleName: string,
): Promise<SignOffPage> {
  const { row, subject } = await getCase(actor, "case.viewWork", caseId);
  const issue = await findIssue(database(), caseId);
  const [gates, staff, readings, named, moves] = await Promise.all([
    gateLedger(database(), caseId),
    database()
      .select({ id: people.id, name: people.name })
      .from(people)
      .where(and(inArray(people.role, LAB_ROLES), eq(people.isActive, true)))
      .orderBy(asc(people.name)),
    database()
      .select({ content: recordVersions.content, at: recordVersions.madeAt, by: people.name })
      .from(records)
      .innerJoin(
        recordVersions,
        and(
          eq(recordVersions.recordId, records.id),
          eq(recordVersions.number, records.latestVersion),
        ),
      )
      .innerJoin(people, eq(people.id, recordVersions.madeById))
      .where(
        and(
          eq(records.caseId, caseId),
          eq(records.kind, "second_reading"),
          ne(records.state, "void"),
        ),
      )
      .orderBy(desc(recordVersions.madeAt))
      .limit(1),
    database()
      .select({ id: people.id, name: people.name })
      .from(people)
      .where(
        inArray(people.id, [
          row.requesterId,
          row.leadId ?? "",
          row.investigatorId ?? "",
          row.secondReaderId ?? "",
        ]),
      ),
    database()
      .select()
      .from(caseMoves)
      .where(eq(caseMoves.caseId, caseId))
      .orderBy(desc(caseMoves.at))
      .limit(1),
  ]);
  const act = (action: Action): SignOffAct => {
    const decision = decide(actor, action, subject);
    return decision.allowed
      ? { isOpen: true, reason: null }
      : { isOpen: false, reason: decision.says };
  };
  const nameOf = (id: string | null) => named.find((person) => person.id === id) ?? null;
  const reading = readings[0]
    ? { ...readingContent.parse(readings[0].content), at: readings[0].at, by: readings[0].by }
    : null;
  const digest = issue ? documentDigest(issue.document) : "";
  const openGates = gates.filter((gate) => !gate.isMet).length;
  const send = act("findings.sendForSignOff");
  return {
    caseId,
    caseNumber: row.number ?? "",
    state: row.state,
    gates,
    issue: issue && {
      number: issue.number,
      revision: issue.revision,
      rootCause: issue.rootCause ?? "",
      documentSha256: digest,
      document: issue.document,
      hasText: plainTextOf(issue.document) !== "",
      signedAt: issue.signedAt?.toISOString() ?? null,
      releasedAt: issue.releasedAt?.toISOString() ?? null,
      fingerprint: issue.manifestSha256,
    },
    reading:
      reading && issue && reading.issueId === issue.id
        ? {
            by: reading.by,
            at: reading.at.toISOString(),
            verdict: reading.verdict,
            note: reading.note,
            isOfThisText: reading.documentSha256 === digest,
          }
        : null,
    secondReader: nameOf(row.secondReaderId),
    readers: staff.filter(
      (person) =>
        person.id !== row.investigatorId &&
        person.id !== row.leadId &&
        !subject.authorIds.includes(person.id),
    ),
    signer: { name: actor.name, roleName },
    goesTo: [row.requesterId, row.leadId, row.investigatorId].flatMap(
      (id) => nameOf(id)?.name ?? [],
    ),
    lastNote: moves[0]?.reason ?? null,
    acts: {
      sendToSecondReader: act("findings.sendToSecondReader"),
      recordReading: act("findings.recordReading"),
      sendForSignOff:
        send.isOpen && openGates > 0
          ? { isOpen: false, reason: `Opens when all eight are met. ${openGates} still open.` }
          : send.isOpen && !issue?.rootCause
            ? { isOpen: false, reason: "Write the root cause at the head of the findings first." }
            : send,
      sendBack: act("findings.sendBack"),
      sign: act("report.sign"),
      openNewIssue: act("report.openNewIssue"),
    },
  };
}
