import "server-only";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { parseInput } from "@/lib/http/parse-input";
import { LABEL_PREFIX } from "@/lib/records/constants";
import { createRecord, nextLabel } from "@/lib/records/write-version";
import { CreateTraverseInput } from "./schemas";
import { checkChoices, eventContent, resultVersion, writeReadings } from "./write-traverse";

export type SavedTraverse = {
  traverseId: string;
  label: string;
  version: number;
  resultVersionId: string;
};

/**
 * Makes a traverse and its result. The result is cited under the label of its traverse.
 * @throws AppError INVALID for a piece of another case or a table that is switched off
 */
export async function createTraverse(actor: Actor, raw: unknown): Promise<SavedTraverse> {
  const { caseId, content } = parseInput(CreateTraverseInput, raw);
  return writeCase(actor, "traverse.record", caseId, async (tx) => {
    await checkChoices(tx, caseId, content, null);
    const label = await nextLabel(tx, caseId, LABEL_PREFIX.traverse);
    const written = await createRecord(tx, actor, { caseId, kind: "traverse", label }, { content });
    await writeReadings(tx, written, content);
    const traverseId = written.recordId;
    const result = await createRecord(
      tx,
      actor,
      { caseId, kind: "hardness_result", scopeId: traverseId, label },
      await resultVersion(tx, caseId, {
        traverseId,
        label,
        versionId: written.versionId,
        content,
      }),
    );
    await recordEvent(tx, {
      caseId,
      actor,
      action: "traverse.record",
      subject: { kind: "traverse", id: traverseId, label },
      before: null,
      after: eventContent(content, 1),
    });
    return { traverseId, label, version: 1, resultVersionId: result.versionId };
  });
}
