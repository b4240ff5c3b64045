import "server-only";
import { and, asc, desc, eq, isNull, ne } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { database } from "@/db/client";
import {
  auditEvents,
  caseHolds,
  caseMoves,
  caseQuestions,
  people,
  records,
  recordVersions,
  reportIssues,
} from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { type CaseSubject, decide } from "@/lib/auth/policy";
import type { CitableValues } from "@/lib/records/constants";
import { describeEvent } from "@/lib/audit/describe-event";
import { type CaseState, HOLD_NAMES, PRIORITY_NAMES } from "./constants";
import { type EarlierReturn, earlierReturns } from "./earlier-returns";
import { type Gate, gateLedger } from "./gates";
import { getCase } from "./get-case";
import type { SeenAssignment } from "./schemas";

export type OverviewMove = { to: CaseState; at: string };
export type OverviewQuote = {
  strand: string;
  label: string;
  text: string;
  tag: string;
  recordId: string;
  kind: string;
  scopeId: string;
};
export type CaseOverview = {
  id: string;
  number: string | null;
  state: CaseState;
  subject: CaseSubject;
  part: { name: string; drawing: string; serial: string; heat: string; material: string };
  people: {
    requester: string;
    investigator: string | null;
    lead: string | null;
    secondReader: string | null;
  };
  priority: string | null;
  dueOn: string | null;
  /** The seats of the case as they stand. */
  assignment: SeenAssignment;
  endReason: string | null;
  gates: Gate[];
  quotes: OverviewQuote[];
  questions: {
    id: string;
    question: string;
    askedAt: string;
    askedBy: string;
    answer: string | null;
    answeredAt: string | null;
  }[];
  holds: { id: string; name: string; reason: string; setAt: string; setBy: string }[];
  moves: OverviewMove[];
  activity: { at: string; who: string; what: string }[];
  issues: { number: number; state: string; releasedAt: string | null }[];
  earlier: EarlierReturn[];
};

const STRAND_OF_KIND: Partial<Record<string, string>> = {
  field_return: "Field return",
  mark: "Images",
  hardness_result: "Hardness",
  strength_statement: "Strength",
  mechanism: "Weighing",
};
const ACTIVITY_SHOWN = 8;
const QUOTES_PER_STRAND = 2;

/** What each strand has to say: its first quotable values. */
async function quotesOf(caseId: string): Promise<OverviewQuote[]> {
  const scopes = alias(records, "scopes");
  const rows = await database()
    .select({
      recordId: records.id,
      kind: records.kind,
      label: records.label,
      scopeId: records.scopeId,
      scope: scopes.label,
      quotes: recordVersions.quotes,
    })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .leftJoin(scopes, eq(scopes.id, records.scopeId))
    .where(and(eq(records.caseId, caseId), ne(records.state, "void")))
    .orderBy(asc(records.madeAt), asc(records.id));
  const shown = new Map<string, number>();
  return rows.flatMap((row) => {
    const strand = STRAND_OF_KIND[row.kind];
    const quotes: CitableValues = row.quotes;
    if (!strand) return [];
    return Object.values(quotes).flatMap((quote) => {
      const n = shown.get(strand) ?? 0;
      if (n >= QUOTES_PER_STRAND) return [];
      shown.set(strand, n + 1);
      const tag =
        row.scope && row.kind === "mark"
          ? `${row.label} · ${row.scope}`
          : row.label.replace(/^R(?=\d)/, "T");
      return [
        {
          strand,
          label: quote.label,
          text: quote.text,
          tag,
          recordId: row.recordId,
          kind: row.kind,
          scopeId: row.scopeId,
        },
      ];
    });
  });
}

/** Everything the overview page shows; a requester gets status, questions and the released report. */
export async function caseOverview(actor: Actor, caseId: string): Promise<CaseOverview> {
  const { row, subject } = await getCase(actor, "case.view", caseId);
  const seesWork = decide(actor, "case.viewWork", subject).allowed;
  const seesHistory = decide(actor, "case.viewHistory", subject).allowed;
  const names = new Map(
    (await database().select({ id: people.id, name: people.name }).from(people)).map((p) => [
      p.id,
      p.name,
    ]),
  );
  const [gates, quotes, questions, holds, moves, activity, issues, earlier] = await Promise.all([
    gateLedger(database(), caseId),
    seesWork ? quotesOf(caseId) : [],
    database()
      .select()
      .from(caseQuestions)
      .where(eq(caseQuestions.caseId, caseId))
      .orderBy(desc(caseQuestions.askedAt)),
    database()
      .select()
      .from(caseHolds)
      .where(and(eq(caseHolds.caseId, caseId), isNull(caseHolds.clearedAt))),
    database()
      .select()
      .from(caseMoves)
      .where(eq(caseMoves.caseId, caseId))
      .orderBy(asc(caseMoves.at)),
    seesHistory
      ? database()
          .select()
          .from(auditEvents)
          .where(eq(auditEvents.chain, caseId))
          .orderBy(desc(auditEvents.position))
          .limit(ACTIVITY_SHOWN)
      : [],
    database()
      .select()
      .from(reportIssues)
      .where(eq(reportIssues.caseId, caseId))
      .orderBy(asc(reportIssues.number)),
    earlierReturns(actor, row),
  ]);
  const name = (id: string | null) => (id === null ? null : (names.get(id) ?? null));
  return {
    id: row.id,
    number: row.number,
    state: row.state,
    subject,
    part: {
      name: row.partName,
      drawing: row.drawingNumber,
      serial: row.serialNumber,
      heat: row.heatNumber,
      material: row.material,
    },
    people: {
      requester: name(row.requesterId) ?? "",
      investigator: name(row.investigatorId),
      lead: name(row.leadId),
      secondReader: name(row.secondReaderId),
    },
    priority: row.priority ? PRIORITY_NAMES[row.priority] : null,
    dueOn: row.dueOn,
    assignment: {
      priority: row.priority,
      leadId: row.leadId,
      investigatorId: row.investigatorId,
      secondReaderId: row.secondReaderId,
      technicianIds: [...subject.technicianIds],
      dueOn: row.dueOn,
    },
    endReason: row.endReason,
    gates: seesWork ? gates : [],
    quotes,
    questions: questions.map((q) => ({
      id: q.id,
      question: q.question,
      askedAt: q.askedAt.toISOString(),
      askedBy: name(q.askedById) ?? "",
      answer: q.answer,
      answeredAt: q.answeredAt?.toISOString() ?? null,
    })),
    holds: holds.map((hold) => ({
      id: hold.id,
      name: HOLD_NAMES[hold.kind],
      reason: seesWork ? hold.reason : "",
      setAt: hold.setAt.toISOString(),
      setBy: name(hold.setById) ?? "",
    })),
    moves: moves.map((move) => ({ to: move.toState, at: move.at.toISOString() })),
    activity: activity.map((event) => ({
      at: event.at.toISOString(),
      who: event.actorName,
      what: describeEvent(event),
    })),
    issues: issues
      .filter((issue) => seesWork || issue.releasedAt !== null)
      .map((issue) => ({
        number: issue.number,
        state: issue.state,
        releasedAt: issue.releasedAt?.toISOString() ?? null,
      })),
    earlier,
  };
}
