import "server-only";
import { and, desc, eq, inArray, ne } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { custodyEntries, items, people, records, recordVersions, reportIssues } from "@/db/schema";
import { canonicalJson, sha256Hex } from "@/lib/canonical-json";
import { custodyBreaks } from "@/lib/evidence/custody-chain";
import {
  chartTraverseIdsOf,
  citedValuesOf,
  type DocumentNode,
  figureImageIdsOf,
  plainTextOf,
} from "@/lib/findings/document";
import { hardnessResultFacts } from "@/lib/traverses/result-facts";
import { mechanismContent } from "@/lib/mechanisms/schemas";
import { countOpenNotes } from "@/lib/findings/list-notes";
import { readingContent } from "@/lib/findings/reading-schema";
import { staleVersionIds } from "@/lib/records/stale";
import { routes } from "@/lib/routes";
import { STRENGTH_VERDICT_NAMES } from "@/lib/strength/constants";
import { strengthContent } from "@/lib/strength/schemas";

/** One row of the ledger that stands before sign-off. */
export type Gate = {
  number: number;
  title: string;
  isMet: boolean;
  detail: string;
  /** The link that mends an open gate. */
  mend: { href: string; verb: string } | null;
};

export const GATE_TITLES = [
  "Custody of every item unbroken",
  "Every cited image calibrated",
  "Hardness table named for each conversion",
  "Strength reconciled",
  "Indents too close settled",
  "One mechanism stands, the rest weighed",
  "Cited values current",
  "Second reader has read",
] as const;

type Latest = {
  recordId: string;
  versionId: string;
  kind: string;
  label: string;
  content: unknown;
  scopeId: string;
};
type Answer = { isMet: boolean; detail: string; mend: Gate["mend"] };

const met = (detail: string): Answer => ({ isMet: true, detail, mend: null });
const open = (detail: string, href: string, verb: string): Answer => ({
  isMet: false,
  detail,
  mend: { href, verb },
});
const count = (n: number, one: string, many = `${one}s`) => `${n} ${n === 1 ? one : many}`;

/** The eight gates of a case as they stand now, worked out from its records. */
export async function gateLedger(reader: Reader, caseId: string): Promise<Gate[]> {
  const [latest, issue] = await Promise.all([
    latestVersions(reader, caseId),
    openIssue(reader, caseId),
  ]);
  const answers = [
    await custody(reader, caseId, latest),
    calibrated(caseId, latest, issue),
    tablesNamed(caseId, latest),
    strength(caseId, latest),
    indents(caseId, latest),
    mechanisms(caseId, latest),
    await citedCurrent(reader, caseId, issue),
    await secondReading(reader, caseId, latest, issue),
  ];
  return answers.map((answer, i) => ({ number: i + 1, title: GATE_TITLES[i] ?? "", ...answer }));
}

async function latestVersions(reader: Reader, caseId: string): Promise<Latest[]> {
  return reader
    .select({
      recordId: records.id,
      versionId: recordVersions.id,
      kind: records.kind,
      label: records.label,
      content: recordVersions.content,
      scopeId: records.scopeId,
    })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(and(eq(records.caseId, caseId), ne(records.state, "void"), ne(records.kind, "mark")));
}

type Issue = { id: string; document: DocumentNode };

async function openIssue(reader: Reader, caseId: string): Promise<Issue | null> {
  const [issue] = await reader
    .select({ id: reportIssues.id, document: reportIssues.document })
    .from(reportIssues)
    .where(eq(reportIssues.caseId, caseId))
    .orderBy(desc(reportIssues.number))
    .limit(1);
  return issue ? { id: issue.id, document: issue.document as DocumentNode } : null;
}

const ofKind = (latest: Latest[], kind: string) => latest.filter((record) => record.kind === kind);

async function custody(reader: Reader, caseId: string, latest: Latest[]): Promise<Answer> {
  const itemRecords = ofKind(latest, "item");
  if (itemRecords.length === 0) {
    return open("No item is registered yet", routes.evidence(caseId), "Register one");
  }
  const entries = await reader
    .select()
    .from(custodyEntries)
    .innerJoin(items, eq(items.recordId, custodyEntries.itemId))
    .where(eq(custodyEntries.caseId, caseId));
  for (const item of itemRecords) {
    const chain = entries
      .map((row) => row.custody_entries)
      .filter((entry) => entry.itemId === item.recordId);
    const first = custodyBreaks(chain)[0];
    if (chain.length === 0) {
      return open(
        `${item.label} has no entry`,
        routes.evidence(caseId, item.recordId),
        "Receive it",
      );
    }
    if (first)
      return open(`${item.label}: ${first}`, routes.evidence(caseId, item.recordId), "See it");
  }
  return met(`${count(itemRecords.length, "item")}, ${count(entries.length, "entry", "entries")}`);
}

function calibrated(caseId: string, latest: Latest[], issue: Issue | null): Answer {
  const figures = [...new Set(issue ? figureImageIdsOf(issue.document) : [])];
  const scaled = new Set(ofKind(latest, "calibration").map((record) => record.scopeId));
  const missing = figures.find((imageId) => !scaled.has(imageId));
  if (missing) {
    const label = latest.find((record) => record.recordId === missing)?.label ?? "A picture";
    return open(`${label} has no scale`, routes.image(caseId, missing), "Set it");
  }
  return met(
    figures.length === 0 ? "No picture is cited" : `${figures.length} of ${figures.length}`,
  );
}

function tablesNamed(caseId: string, latest: Latest[]): Answer {
  const results = ofKind(latest, "hardness_result");
  if (results.length === 0) return met("No hardness in this case");
  const facts = results.map((record) => hardnessResultFacts(record.content));
  const unnamed = facts.find((fact) => fact.hasConversions && fact.tableTitles.length === 0);
  if (unnamed)
    return open(
      `${unnamed.traverseLabel} names no table`,
      routes.traverse(caseId, unnamed.traverseId),
      "Name it",
    );
  const titles = [...new Set(facts.flatMap((fact) => fact.tableTitles))];
  return met(titles.length === 0 ? "Nothing is converted" : titles.join("; "));
}

function strength(caseId: string, latest: Latest[]): Answer {
  const statement = ofKind(latest, "strength_statement")[0];
  if (!statement) return open("Nothing stated yet", routes.strength(caseId), "State it");
  const { verdict } = strengthContent.parse(statement.content);
  return verdict === "disagree"
    ? open(STRENGTH_VERDICT_NAMES[verdict], routes.strength(caseId), "Explain it")
    : met(STRENGTH_VERDICT_NAMES[verdict]);
}

function indents(caseId: string, latest: Latest[]): Answer {
  const facts = ofKind(latest, "hardness_result").map((record) =>
    hardnessResultFacts(record.content),
  );
  if (facts.length === 0) return met("No hardness in this case");
  const unsettled = facts.find((fact) => fact.unsettled.length > 0);
  return unsettled
    ? open(
        `${unsettled.traverseLabel}, ${unsettled.unsettled[0]}`,
        routes.traverse(caseId, unsettled.traverseId),
        "Settle it",
      )
    : met("All settled");
}

function mechanisms(caseId: string, latest: Latest[]): Answer {
  const list = ofKind(latest, "mechanism").map((record) => mechanismContent.parse(record.content));
  if (list.length === 0)
    return open("No mechanism is listed yet", routes.weighing(caseId), "Weigh one");
  const standing = list.filter((mechanism) => mechanism.verdict === "stands");
  const unweighed = list.filter((mechanism) => mechanism.verdict === "open");
  if (unweighed.length > 0) {
    return open(
      `${count(unweighed.length, "mechanism")} not weighed`,
      routes.weighing(caseId),
      "Weigh them",
    );
  }
  return standing.length === 1
    ? met(count(list.length, "mechanism"))
    : open(
        standing.length === 0 ? "None stands" : `${standing.length} stand`,
        routes.weighing(caseId),
        "Settle it",
      );
}

async function citedCurrent(reader: Reader, caseId: string, issue: Issue | null): Promise<Answer> {
  if (!issue || plainTextOf(issue.document) === "") {
    return open("No findings are written yet", routes.findings(caseId), "Write them");
  }
  const cited = citedValuesOf(issue.document);
  const charts = chartTraverseIdsOf(issue.document);
  const stale = await staleVersionIds(
    reader,
    cited.map((value) => value.versionId),
  );
  const voided = await voidRecordIds(reader, [
    ...cited.map((value) => value.recordId),
    ...charts,
    ...figureImageIdsOf(issue.document),
  ]);
  const withdrawn =
    cited.filter((value) => voided.has(value.recordId)).length +
    [...charts, ...figureImageIdsOf(issue.document)].filter((id) => voided.has(id)).length;
  if (withdrawn > 0)
    return open(`${count(withdrawn, "source")} withdrawn`, routes.findings(caseId), "Mend it");
  const waiting = cited.filter((value) => stale.has(value.versionId) && value.keptReason === null);
  return waiting.length > 0
    ? open(`${waiting.length} stale`, routes.findings(caseId), "Update it")
    : met(cited.length === 0 ? "No value is cited" : `${cited.length} of ${cited.length}`);
}

async function voidRecordIds(reader: Reader, recordIds: string[]): Promise<Set<string>> {
  if (recordIds.length === 0) return new Set();
  const rows = await reader
    .select({ id: records.id })
    .from(records)
    .where(and(inArray(records.id, recordIds), eq(records.state, "void")));
  return new Set(rows.map((row) => row.id));
}

/** Digest of a document as the second reader saw it. */
export function documentDigest(document: unknown): string {
  return sha256Hex(canonicalJson(document));
}

async function secondReading(
  reader: Reader,
  caseId: string,
  latest: Latest[],
  issue: Issue | null,
): Promise<Answer> {
  const reading = ofKind(latest, "second_reading")
    .map((record) => readingContent.parse(record.content))
    .find((content) => content.issueId === issue?.id);
  if (!issue || !reading) return open("Nobody has read it yet", routes.signOff(caseId), "Ask one");
  if (reading.verdict !== "read")
    return open("Sent back with a note", routes.findings(caseId), "See it");
  if (reading.documentSha256 !== documentDigest(issue.document)) {
    return open("The findings changed after the reading", routes.signOff(caseId), "Ask again");
  }
  const openNotes = await countOpenNotes(reader, issue.id);
  if (openNotes > 0) {
    return open(
      `Read, ${count(openNotes, "note")} of the reader not settled`,
      routes.findings(caseId),
      openNotes === 1 ? "Settle it" : "Settle them",
    );
  }
  const [reader2] = await reader
    .select({ name: people.name })
    .from(people)
    .where(eq(people.id, reading.readerId));
  return met(reader2?.name ?? "Read");
}
