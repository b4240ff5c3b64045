import "server-only";
import { and, eq } from "drizzle-orm";
import { records, recordVersions } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { addVersion } from "@/lib/records/write-version";
import { DescribeItemInput } from "./schemas";

/** Changes what is said of an item; the earlier words stay as a version. */
export async function describeItem(actor: Actor, raw: unknown): Promise<{ version: number }> {
  const input = parseInput(DescribeItemInput, raw);
  return writeCase(actor, "evidence.register", input.caseId, async (tx) => {
    const [before] = await tx
      .select({ content: recordVersions.content })
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
          eq(records.id, input.itemId),
          eq(records.caseId, input.caseId),
          eq(records.kind, "item"),
        ),
      );
    if (!before) throw notFound();
    const written = await addVersion(tx, actor, input.itemId, input.seenVersion, {
      content: input.content,
      reason: input.reason,
    });
    await recordEvent(tx, {
      caseId: input.caseId,
      actor,
      action: "evidence.register",
      subject: { kind: "item", id: input.itemId, label: written.label },
      before: before.content,
      after: { ...input.content, reason: input.reason },
    });
    return { version: written.number };
  });
}
