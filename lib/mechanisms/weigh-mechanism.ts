import "server-only";
import { and, eq } from "drizzle-orm";
import { records, recordVersions } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { canMove } from "@/lib/cases/lifecycle";
import { moveCase } from "@/lib/cases/move-case";
import { writeCase } from "@/lib/cases/write-case";
import { notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import type { CitableValues } from "@/lib/records/constants";
import { addVersion, createRecord, nextLabel } from "@/lib/records/write-version";
import { MECHANISM_CODES, MECHANISM_VERDICT_NAMES } from "./constants";
import { type MechanismContent, WeighMechanismInput } from "./schemas";

const nameOf = (content: MechanismContent) =>
  content.detail
    ? `${MECHANISM_CODES[content.code]}, ${content.detail}`
    : MECHANISM_CODES[content.code];

const quotesOf = (content: MechanismContent): CitableValues => ({
  verdict: {
    label: nameOf(content),
    text: MECHANISM_VERDICT_NAMES[content.verdict].toLowerCase(),
    value: null,
    unit: null,
    expandedUncertainty: null,
    source: "stated",
  },
});

/** Adds a mechanism or weighs one that is listed. The first verdict starts the weighing. */
export async function weighMechanism(
  actor: Actor,
  raw: unknown,
): Promise<{ recordId: string; label: string; version: number }> {
  const { caseId, recordId, seenVersion, content } = parseInput(WeighMechanismInput, raw);
  return writeCase(actor, "mechanism.weigh", caseId, async (tx, { row }) => {
    const [existing] =
      recordId === null
        ? []
        : await tx
            .select({ id: records.id, before: recordVersions.content })
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
                eq(records.id, recordId),
                eq(records.caseId, caseId),
                eq(records.kind, "mechanism"),
              ),
            );
    if (recordId !== null && !existing) throw notFound();
    const version = { content, quotes: quotesOf(content) };
    const written = existing
      ? await addVersion(tx, actor, existing.id, seenVersion, version)
      : await createRecord(
          tx,
          actor,
          { caseId, kind: "mechanism", label: await nextLabel(tx, caseId, "W") },
          version,
        );
    await recordEvent(tx, {
      caseId,
      actor,
      action: "mechanism.weigh",
      subject: { kind: "mechanism", id: written.recordId, label: nameOf(content) },
      before: existing?.before ?? null,
      after: content,
    });
    if (content.verdict !== "open" && canMove("startWeighing", row.state)) {
      await moveCase(tx, actor, row, "startWeighing");
    }
    return { recordId: written.recordId, label: written.label, version: written.number };
  });
}
