import "server-only";
import { and, desc, eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { labelCounters, people, recordEdges, records, recordVersions } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { canonicalJson, sha256Hex } from "@/lib/canonical-json";
import { AppError, notFound } from "@/lib/errors";
import { newId } from "@/lib/new-id";
import type { CitableValues, RecordKind } from "./constants";

export type VersionContent = {
  content: unknown;
  quotes?: CitableValues;
  headline?: { value: number; unit: string; expandedUncertainty: number | null } | null;
  method?: { name: string; version: string } | null;
  reason?: string | null;
  /** Versions this one was made from. */
  inputs?: readonly string[];
};
export type WrittenVersion = { recordId: string; versionId: string; number: number; label: string };

/** Next label of a prefix in a scope: "T" gives T1, T2; "IM-" gives IM-01. Never handed out twice. */
export async function nextLabel(tx: Transaction, scopeId: string, prefix: string): Promise<string> {
  await tx
    .insert(labelCounters)
    .values({ scopeId, prefix, last: 1 })
    .onDuplicateKeyUpdate({ set: { last: sql`${labelCounters.last} + 1` } });
  const [counter] = await tx
    .select({ last: labelCounters.last })
    .from(labelCounters)
    .where(and(eq(labelCounters.scopeId, scopeId), eq(labelCounters.prefix, prefix)));
  if (!counter) throw new Error(`label counter ${scopeId} ${prefix} was not made`);
  return prefix.endsWith("-")
    ? `${prefix}${String(counter.last).padStart(2, "0")}`
    : `${prefix}${counter.last}`;
}

/** Makes a record with its first version. The caller holds the lock on the case and records the event. */
export async function createRecord(
  tx: Transaction,
  actor: Pick<Actor, "id">,
  made: { caseId: string; kind: RecordKind; scopeId?: string; label: string },
  version: VersionContent,
): Promise<WrittenVersion> {
  const recordId = newId("rec");
  await tx.insert(records).values({
    id: recordId,
    caseId: made.caseId,
    kind: made.kind,
    scopeId: made.scopeId ?? made.caseId,
    label: made.label,
    latestVersion: 1,
    madeById: actor.id,
  });
  const versionId = await insertVersion(tx, actor, recordId, 1, version);
  return { recordId, versionId, number: 1, label: made.label };
}

/**
 * Adds a version to a record, if nobody else did since the version this person saw.
 * @param seenNumber version number the person saw; null when Riverline recomputes by itself
 * @throws AppError CONFLICT with both contents; LOCKED when the record is void
 */
export async function addVersion(
  tx: Transaction,
  actor: Pick<Actor, "id">,
  recordId: string,
  seenNumber: number | null,
  version: VersionContent,
): Promise<WrittenVersion> {
  const [record] = await tx.select().from(records).where(eq(records.id, recordId)).for("update");
  if (!record) throw notFound();
  if (seenNumber !== null && record.latestVersion !== seenNumber) {
    throw await conflictOn(tx, recordId, record.label, version.content);
  }
  if (record.state === "void") {
    throw new AppError(
      "LOCKED",
      `${record.label} was withdrawn. Nothing was changed. Put it back first.`,
    );
  }
  const number = record.latestVersion + 1;
  const versionId = await insertVersion(tx, actor, recordId, number, version);
  await tx
    .update(records)
    .set({ latestVersion: number, state: "recorded" })
    .where(eq(records.id, recordId));
  return { recordId, versionId, number, label: record.label };
}

async function insertVersion(
  tx: Transaction,
  actor: Pick<Actor, "id">,
  recordId: string,
  number: number,
  version: VersionContent,
): Promise<string> {
  const versionId = newId("ver");
  const inputs = [...new Set(version.inputs ?? [])].sort();
  const quotes = version.quotes ?? {};
  await tx.insert(recordVersions).values({
    id: versionId,
    recordId,
    number,
    content: version.content,
    quotes,
    headlineValue: version.headline?.value ?? null,
    headlineUnit: version.headline?.unit ?? null,
    headlineUncertainty: version.headline?.expandedUncertainty ?? null,
    method: version.method?.name ?? null,
    methodVersion: version.method?.version ?? null,
    reason: version.reason ?? null,
    madeById: actor.id,
    sha256: versionDigest({
      content: version.content,
      quotes,
      method: version.method ?? null,
      inputs,
    }),
  });
  if (inputs.length > 0) {
    await tx
      .insert(recordEdges)
      .values(inputs.map((inputVersionId) => ({ versionId, inputVersionId })));
  }
  return versionId;
}

/** Digest of what a version says and rests on; checked again when a report is signed. */
export function versionDigest(version: {
  content: unknown;
  quotes: CitableValues;
  method: { name: string; version: string } | null;
  inputs: readonly string[];
}): string {
  return sha256Hex(canonicalJson(version));
}

async function conflictOn(tx: Transaction, recordId: string, label: string, yours: unknown) {
  const [latest] = await tx
    .select({ content: recordVersions.content, at: recordVersions.madeAt, by: people.name })
    .from(recordVersions)
    .innerJoin(people, eq(people.id, recordVersions.madeById))
    .where(eq(recordVersions.recordId, recordId))
    .orderBy(desc(recordVersions.number))
    .limit(1);
  return new AppError(
    "CONFLICT",
    `${label} was not saved. ${latest?.by ?? "Someone"} changed it since you opened it. Yours is kept here; compare the two.`,
    latest
      ? {
          conflict: {
            yours,
            theirs: latest.content,
            changedBy: latest.by,
            changedAt: latest.at.toISOString(),
          },
        }
      : {},
  );
}
