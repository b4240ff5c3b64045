import "server-only";
import { eq } from "drizzle-orm";
import { cases } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { canonicalJson } from "@/lib/canonical-json";
import { AppError } from "@/lib/errors";
import { formatDate } from "@/lib/format/dates";
import { parseInput } from "@/lib/http/parse-input";
import { mailAboutCase } from "./case-mail";
import { checkAssignment } from "./check-assignment";
import { PRIORITY_NAMES } from "./constants";
import { AssignPeopleInput, type SeenAssignment } from "./schemas";
import { assignmentColumns, currentAssignment, writeTechnicians } from "./write-assignment";
import { writeCase } from "./write-case";

const inOrder = (one: SeenAssignment) =>
  canonicalJson({ ...one, technicianIds: [...one.technicianIds].sort() });

const idsOf = (one: SeenAssignment) =>
  new Set([one.leadId, one.investigatorId, one.secondReaderId, ...one.technicianIds]);

/**
 * Names the people of a case anew, its priority and its date; mails those who are new to it.
 * @throws AppError CONFLICT with both when it changed since the person opened it
 */
export async function assignPeople(actor: Actor, raw: unknown): Promise<void> {
  const input = parseInput(AssignPeopleInput, raw);
  await writeCase(actor, "case.assign", input.caseId, async (tx, { row }) => {
    const { caseId: _caseId, seen, ...chosen } = input;
    const before = await currentAssignment(tx, row);
    if (seen && inOrder(seen) !== inOrder(before)) {
      throw new AppError(
        "CONFLICT",
        "Someone else named people for this case since you opened it. Nothing was changed. Yours is kept here; compare the two.",
        {
          conflict: {
            yours: chosen,
            theirs: before,
            changedBy: "Someone else",
            changedAt: row.changedAt.toISOString(),
          },
        },
      );
    }
    const named = await checkAssignment(tx, row, chosen);
    await tx.update(cases).set(assignmentColumns(chosen)).where(eq(cases.id, row.id));
    await writeTechnicians(tx, row.id, chosen.technicianIds);
    await recordEvent(tx, {
      caseId: row.id,
      actor,
      action: "case.assign",
      subject: { kind: "case", id: row.id, label: row.number ?? "Draft" },
      before,
      after: chosen,
    });
    const already = idsOf(before);
    const fresh = [...named.values()].filter(({ id }) => !already.has(id) && id !== actor.id);
    await mailAboutCase(tx, fresh, row, "you are on this case", {
      news: `${actor.name} named you for this case.`,
      facts: [
        ["Priority", PRIORITY_NAMES[chosen.priority]],
        ["Due", formatDate(chosen.dueOn)],
      ],
    });
  });
}
