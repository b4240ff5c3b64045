import "server-only";
import { and, eq, ne } from "drizzle-orm";
import { records, recordVersions } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import type { CitableValues } from "@/lib/records/constants";
import { addVersion, createRecord, nextLabel } from "@/lib/records/write-version";
import { STRENGTH_VERDICT_NAMES } from "./constants";
import { StateStrengthInput, type StrengthContent } from "./schemas";

const quotesOf = (content: StrengthContent): CitableValues => ({
  verdict: {
    label: "Strength",
    text: STRENGTH_VERDICT_NAMES[content.verdict],
    value: null,
    unit: null,
    expandedUncertainty: null,
    source: "estimated",
  },
});

/** States whether hardness, structure, tests and drawing agree, and why. One statement a case. */
export async function stateStrength(actor: Actor, raw: unknown): Promise<{ version: number }> {
  const { caseId, seenVersion, ...content } = parseInput(StateStrengthInput, raw);
  return writeCase(actor, "strength.state", caseId, async (tx) => {
    const [existing] = await tx
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
          eq(records.caseId, caseId),
          eq(records.kind, "strength_statement"),
          ne(records.state, "void"),
        ),
      );
    if (existing && seenVersion === null) {
      throw new AppError(
        "CONFLICT",
        "Someone stated the strength in the meantime. Nothing was changed. Load the page again; your words are kept here.",
      );
    }
    const version = { content, quotes: quotesOf(content) };
    const written = existing
      ? await addVersion(tx, actor, existing.id, seenVersion, version)
      : await createRecord(
          tx,
          actor,
          { caseId, kind: "strength_statement", label: await nextLabel(tx, caseId, "SS") },
          version,
        );
    await recordEvent(tx, {
      caseId,
      actor,
      action: "strength.state",
      subject: { kind: "strength_statement", id: written.recordId, label: written.label },
      before: existing?.before ?? null,
      after: content,
    });
    return { version: written.number };
  });
}
