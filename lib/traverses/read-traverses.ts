import "server-only";
import { and, asc, eq, inArray } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { database, type Reader } from "@/db/client";
import { people, records, recordVersions } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { decide } from "@/lib/auth/policy";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";
import { fieldReturnContent } from "@/lib/intake/schemas";
import { enabledTableIds } from "@/lib/reference/enabled-tables";
import type { TableId } from "@/lib/hardness/published-tables";
import { NO_PROPOSAL, proposeFromReturn, type TraverseProposal } from "./propose-from-return";
import {
  resultContent,
  traverseContent,
  type ResultContent,
  type TraverseContent,
} from "./schemas";

export type LoadedTraverse = {
  traverseId: string;
  label: string;
  version: number;
  versionId: string;
  isVoid: boolean;
  voidReason: string | null;
  content: TraverseContent;
  result: ResultContent;
  resultRecordId: string;
  resultVersionId: string;
  by: string;
  at: string;
};

const results = alias(records, "results");
const resultVersions = alias(recordVersions, "result_versions");

function select(reader: Reader) {
  return reader
    .select({
      traverseId: records.id,
      label: records.label,
      state: records.state,
      voidReason: records.voidReason,
      version: recordVersions.number,
      versionId: recordVersions.id,
      content: recordVersions.content,
      result: resultVersions.content,
      resultRecordId: results.id,
      resultVersionId: resultVersions.id,
      by: people.name,
      at: recordVersions.madeAt,
    })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .innerJoin(people, eq(people.id, recordVersions.madeById))
    .innerJoin(results, and(eq(results.scopeId, records.id), eq(results.kind, "hardness_result")))
    .innerJoin(
      resultVersions,
      and(
        eq(resultVersions.recordId, results.id),
        eq(resultVersions.number, results.latestVersion),
      ),
    );
}

type Row = Awaited<ReturnType<typeof select>>[number];

const loaded = ({ state, at, content, result, ...row }: Row): LoadedTraverse => ({
  ...row,
  isVoid: state === "void",
  content: traverseContent.parse(content),
  result: resultContent.parse(result),
  at: at.toISOString(),
});

/** The traverses of a case with their results, in the order they were made. Asks no policy. */
export async function loadTraverses(reader: Reader, caseId: string): Promise<LoadedTraverse[]> {
  const rows = await select(reader)
    .where(and(eq(records.caseId, caseId), eq(records.kind, "traverse")))
    .orderBy(asc(records.madeAt), asc(records.id));
  return rows.map(loaded);
}

/** @throws AppError NOT_FOUND when there is no such traverse. Asks no policy. */
export async function loadTraverse(reader: Reader, traverseId: string): Promise<LoadedTraverse> {
  const [row] = await select(reader).where(
    and(eq(records.id, traverseId), eq(records.kind, "traverse")),
  );
  if (!row) throw notFound();
  return loaded(row);
}

export type LatestReturn = { versionId: string; proposal: TraverseProposal };

/** What the field return, as it stands, asks of a traverse; null before it was sent. */
export async function latestReturn(reader: Reader, caseId: string): Promise<LatestReturn | null> {
  const [row] = await reader
    .select({ versionId: recordVersions.id, content: recordVersions.content })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(and(eq(records.caseId, caseId), eq(records.kind, "field_return")));
  if (!row) return null;
  const { answers } = fieldReturnContent.parse(row.content);
  return { versionId: row.versionId, proposal: proposeFromReturn(answers) };
}

export type HardnessStation = {
  caseNumber: string | null;
  traverses: LoadedTraverse[];
  proposal: TraverseProposal;
  enabledTableIds: TableId[];
  items: { id: string; label: string }[];
  /** Why nothing can be changed here now; null when it can. */
  refusal: string | null;
};

/** Everything that the hardness station of a case shows. */
export async function listTraverses(actor: Actor, caseId: string): Promise<HardnessStation> {
  const { row, subject } = await getCase(actor, "case.viewWork", caseId);
  const [traverses, fieldReturn, enabled, items] = await Promise.all([
    loadTraverses(database(), caseId),
    latestReturn(database(), caseId),
    enabledTableIds(database()),
    database()
      .select({ id: records.id, label: records.label })
      .from(records)
      .where(
        and(
          eq(records.caseId, caseId),
          eq(records.kind, "item"),
          inArray(records.state, ["recorded", "checked"]),
        ),
      )
      .orderBy(asc(records.madeAt), asc(records.id)),
  ]);
  const decision = decide(actor, "traverse.record", subject);
  return {
    caseNumber: row.number,
    traverses,
    proposal: fieldReturn?.proposal ?? NO_PROPOSAL,
    enabledTableIds: [...enabled],
    items,
    refusal: decision.allowed ? null : decision.says,
  };
}
