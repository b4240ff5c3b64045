import "server-only";
import { and, asc, eq, ne } from "drizzle-orm";
import { database } from "@/db/client";
import { images, people, records, recordVersions } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { decide } from "@/lib/auth/policy";
import { getCase } from "@/lib/cases/get-case";
import type { Chart } from "@/lib/charts/primitives";
import { notFound } from "@/lib/errors";
import { pictureTitle } from "@/lib/images/picture-facts";
import { chartOfTraverse } from "@/lib/traverses/chart-of-traverse";
import { loadTraverses } from "@/lib/traverses/read-traverses";
import { type Citable, citableValues } from "./citable-values";
import { type CitedState, citedStates } from "./cited-states";
import type { DocumentNode } from "./document";
import { findIssue } from "./find-issue";
import { listNotes } from "./list-notes";
import type { ReviewNote } from "./constants";

export type FindingsPage = {
  caseId: string;
  caseNumber: string;
  issueNumber: number;
  revision: number;
  document: DocumentNode;
  rootCause: string;
  savedAt: string | null;
  savedBy: string | null;
  citable: Citable[];
  cited: CitedState[];
  pictures: { id: string; label: string; caption: string }[];
  traverses: { id: string; label: string; name: string; chart: Chart }[];
  isSigned: boolean;
  notes: ReviewNote[];
  /** What this person may do with the notes of the second reader now. */
  noteActs: { leave: boolean; answer: boolean };
  /** Why nothing can be written now; null when it can. */
  refusal: string | null;
};

/** Everything the findings page needs. @throws AppError NOT_FOUND before the case is accepted */
export async function readFindings(actor: Actor, caseId: string): Promise<FindingsPage> {
  const { row, subject } = await getCase(actor, "case.viewWork", caseId);
  const issue = await findIssue(database(), caseId);
  if (!issue) throw notFound();
  const [citable, cited, pictures, traverses, notes, [writer]] = await Promise.all([
    citableValues(database(), caseId),
    citedStates(database(), issue.document),
    database()
      .select({ id: images.recordId, label: records.label, content: recordVersions.content })
      .from(images)
      .innerJoin(records, eq(records.id, images.recordId))
      .innerJoin(
        recordVersions,
        and(
          eq(recordVersions.recordId, records.id),
          eq(recordVersions.number, records.latestVersion),
        ),
      )
      .where(and(eq(images.caseId, caseId), eq(images.state, "ready"), ne(records.state, "void")))
      .orderBy(asc(records.madeAt), asc(records.id)),
    loadTraverses(database(), caseId),
    listNotes(database(), issue.id),
    issue.savedById
      ? database().select({ name: people.name }).from(people).where(eq(people.id, issue.savedById))
      : Promise.resolve([]),
  ]);
  const decision = decide(actor, "findings.write", subject);
  return {
    caseId,
    caseNumber: row.number ?? "",
    issueNumber: issue.number,
    revision: issue.revision,
    document: issue.document,
    rootCause: issue.rootCause ?? "",
    savedAt: writer ? issue.savedAt.toISOString() : null,
    savedBy: writer?.name ?? null,
    citable,
    cited,
    pictures: pictures.map(({ id, label, content }) => ({
      id,
      label,
      caption: pictureTitle(content),
    })),
    traverses: traverses
      .filter((traverse) => !traverse.isVoid)
      .map((traverse) => ({
        id: traverse.traverseId,
        label: traverse.label,
        name: traverse.content.name,
        chart: chartOfTraverse(traverse, { theme: "paper" }),
      })),
    isSigned: issue.signedAt !== null,
    notes,
    noteActs: {
      leave: decide(actor, "findings.leaveNote", subject).allowed,
      answer: decide(actor, "findings.answerNote", subject).allowed,
    },
    refusal: decision.allowed ? null : decision.says,
  };
}
