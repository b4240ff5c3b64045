import "server-only";
import { and, asc, desc, eq, ne } from "drizzle-orm";
import type { Reader } from "@/db/client";
import {
  custodyEntries,
  items,
  organisations,
  people,
  records,
  recordVersions,
  reportIssues,
} from "@/db/schema";
import { gateLedger } from "@/lib/cases/gates";
import type { CaseRow } from "@/lib/cases/subject";
import { notFound } from "@/lib/errors";
import { itemContent } from "@/lib/evidence/schemas";
import { citableValues } from "@/lib/findings/citable-values";
import { chartTraverseIdsOf } from "@/lib/findings/document";
import type { IssueRow } from "@/lib/findings/find-issue";
import { readingContent } from "@/lib/findings/reading-schema";
import { formatDate, formatDateTimeWithZone } from "@/lib/format/dates";
import { openQuestions } from "@/lib/reports/open-questions";
import { laboratory } from "@/lib/people/laboratory";
import { ROLE_NAMES } from "@/lib/people/constants";
import { chartOfTraverse } from "@/lib/traverses/chart-of-traverse";
import { loadTraverse, loadTraverses } from "@/lib/traverses/read-traverses";
import type { FrozenReport } from "./frozen-report";
import { manifestOf } from "./manifest";

const given = (text: string) => text || "–";

async function personOf(reader: Reader, id: string | null, at: Date | null) {
  if (id === null || at === null) return null;
  const [person] = await reader
    .select({ name: people.name, role: people.role })
    .from(people)
    .where(eq(people.id, id));
  return person
    ? { name: person.name, role: ROLE_NAMES[person.role], at: formatDateTimeWithZone(at) }
    : null;
}

async function secondReading(reader: Reader, caseId: string, issueId: string) {
  const rows = await reader
    .select({ content: recordVersions.content, at: recordVersions.madeAt })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(
      and(
        eq(records.caseId, caseId),
        eq(records.kind, "second_reading"),
        ne(records.state, "void"),
      ),
    )
    .orderBy(desc(recordVersions.madeAt));
  const reading = rows
    .map((row) => ({ ...readingContent.parse(row.content), at: row.at }))
    .find((row) => row.issueId === issueId);
  return reading?.verdict === "read" ? personOf(reader, reading.readerId, reading.at) : null;
}

async function itemRows(reader: Reader, caseId: string): Promise<string[][]> {
  const rows = await reader
    .select({ id: records.id, label: records.label, content: recordVersions.content })
    .from(items)
    .innerJoin(records, eq(records.id, items.recordId))
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(and(eq(items.caseId, caseId), ne(records.state, "void")))
    .orderBy(asc(records.madeAt), asc(records.id));
  const entries = await reader
    .select()
    .from(custodyEntries)
    .where(eq(custodyEntries.caseId, caseId))
    .orderBy(asc(custodyEntries.position));
  return rows.map((row) => {
    const content = itemContent.parse(row.content);
    const own = entries.filter((entry) => entry.itemId === row.id);
    return [
      row.label,
      content.name,
      given(content.condition.join(", ")),
      own[0] ? formatDate(own[0].at) : "–",
      given(own.at(-1)?.toPlace ?? ""),
      String(own.length),
    ];
  });
}

/**
 * Everything the report of an issue says, as it stands now. With `signer`, as it is being signed.
 * The caller has asked the policy and, for signing, holds the lock on the case.
 */
export async function collectReport(
  reader: Reader,
  row: CaseRow,
  issue: IssueRow,
  signer: { id: string; at: Date } | null,
): Promise<FrozenReport> {
  const [lab, [client], gates, citable, traverses, issues, readBy] = await Promise.all([
    laboratory(),
    reader
      .select({ name: organisations.name })
      .from(organisations)
      .where(eq(organisations.id, row.organisationId)),
    gateLedger(reader, row.id),
    citableValues(reader, row.id),
    loadTraverses(reader, row.id),
    reader
      .select()
      .from(reportIssues)
      .where(eq(reportIssues.caseId, row.id))
      .orderBy(asc(reportIssues.number)),
    secondReading(reader, row.id, issue.id),
  ]);
  if (!lab) throw notFound();
  const [requester] = await reader
    .select({ name: people.name })
    .from(people)
    .where(eq(people.id, row.requesterId));
  const charts: FrozenReport["charts"] = {};
  for (const traverseId of new Set(chartTraverseIdsOf(issue.document))) {
    charts[traverseId] = chartOfTraverse(await loadTraverse(reader, traverseId), {
      theme: "paper",
    });
  }
  const itemTable = await itemRows(reader, row.id);
  const now = signer?.at ?? new Date();
  return {
    caseNumber: row.number ?? "",
    issueNumber: issue.number,
    title: row.title,
    laboratory: { name: lab.name, addressLine: lab.addressLine ?? "" },
    facts: [
      { label: "For", text: [client?.name, requester?.name].filter(Boolean).join(", ") },
      { label: "Received", text: row.submittedAt ? formatDate(row.submittedAt) : "–" },
      {
        label: "Part",
        text: given(
          [
            row.partName,
            row.drawingNumber && `drawing ${row.drawingNumber}`,
            row.serialNumber && `serial ${row.serialNumber}`,
          ]
            .filter(Boolean)
            .join(", "),
        ),
      },
      { label: "Accepted", text: row.acceptedAt ? formatDate(row.acceptedAt) : "–" },
      {
        label: "Material",
        text: given(
          [row.material, row.heatNumber && `heat ${row.heatNumber}`].filter(Boolean).join(", "),
        ),
      },
      { label: "Items", text: itemTable.map((item) => item[0]).join(", ") || "–" },
    ],
    rootCause: issue.rootCause ?? "",
    document: issue.document,
    investigatedBy: await personOf(reader, row.investigatorId, issue.savedAt),
    readBy,
    signedBy: signer ? await personOf(reader, signer.id, signer.at) : null,
    sameHandsNote: readBy === null ? "No second reader has read this text." : null,
    items: itemTable,
    supplied: citable
      .filter((value) => value.group === "Field return")
      .map((value) => [value.label, value.text]),
    unknowns: await openQuestions(reader, row.id),
    conversions: traverses
      .filter((traverse) => !traverse.isVoid)
      .map((traverse) => [
        traverse.label,
        traverse.content.name,
        traverse.result.tableTitles.join("; ") || "Nothing converted",
      ]),
    gates: gates.map((gate) => [
      String(gate.number),
      gate.title,
      gate.isMet ? "met" : "open",
      gate.detail,
    ]),
    issues: issues.map((other) => [
      String(other.number),
      other.signedAt
        ? formatDate(other.signedAt)
        : other.id === issue.id && signer
          ? formatDate(signer.at)
          : "not signed",
      other.reason ?? "First issue",
    ]),
    manifest: await manifestOf(reader, issue.document),
    charts,
    at: now.toISOString(),
  };
}
