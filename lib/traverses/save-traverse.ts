import "server-only";
import { desc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { recordEdges, recordVersions } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { canonicalJson } from "@/lib/canonical-json";
import { writeCase } from "@/lib/cases/write-case";
import { parseInput } from "@/lib/http/parse-input";
import { addVersion } from "@/lib/records/write-version";
import type { SavedTraverse } from "./create-traverse";
import { SaveTraverseInput, traverseContent } from "./schemas";
import {
  checkChoices,
  eventContent,
  findTraverse,
  resultVersion,
  writeReadings,
} from "./write-traverse";

/** The latest version of a result and what it was made from. */
async function latestResult(tx: Transaction, resultId: string) {
  const [latest] = await tx
    .select({ versionId: recordVersions.id, content: recordVersions.content })
    .from(recordVersions)
    .where(eq(recordVersions.recordId, resultId))
    .orderBy(desc(recordVersions.number))
    .limit(1);
  if (!latest) throw new Error(`hardness result ${resultId} has no version`);
  const edges = await tx
    .select({ id: recordEdges.inputVersionId })
    .from(recordEdges)
    .where(eq(recordEdges.versionId, latest.versionId));
  return { ...latest, inputs: edges.map(({ id }) => id) };
}

/**
 * Saves a traverse as it stands now and works its result out anew. What did not change is not
 * written again: neither the traverse as typed, nor a result made from the same.
 * @throws AppError CONFLICT with both contents when someone saved it since; LOCKED when withdrawn
 */
export async function saveTraverse(actor: Actor, raw: unknown): Promise<SavedTraverse> {
  const { caseId, traverseId, seenVersion, content } = parseInput(SaveTraverseInput, raw);
  return writeCase(actor, "traverse.record", caseId, async (tx) => {
    const head = await findTraverse(tx, caseId, traverseId);
    const before = traverseContent.parse(head.content);
    const isSame = canonicalJson(before) === canonicalJson(content);
    const { label } = head;
    if (!isSame) await checkChoices(tx, caseId, content, before);
    const written = isSame
      ? { recordId: traverseId, versionId: head.versionId, number: head.version, label }
      : await addVersion(tx, actor, traverseId, seenVersion, { content });
    if (!isSame) await writeReadings(tx, written, content);

    const { versionId } = written;
    const made = await resultVersion(tx, caseId, { traverseId, label, versionId, content });
    const latest = await latestResult(tx, head.resultId);
    const isSameResult =
      canonicalJson([latest.content, latest.inputs.toSorted()]) ===
      canonicalJson([made.content, made.inputs.toSorted()]);
    const result = isSameResult ? latest : await addVersion(tx, actor, head.resultId, null, made);
    if (!isSame || !isSameResult)
      await recordEvent(tx, {
        caseId,
        actor,
        action: "traverse.record",
        subject: { kind: "traverse", id: traverseId, label },
        before: eventContent(before, head.version),
        after: eventContent(content, written.number),
      });
    return { traverseId, label, version: written.number, resultVersionId: result.versionId };
  });
}
