import "server-only";
import type { Actor } from "@/lib/auth/actor";
import { createFirstIssue } from "@/lib/findings/create-issue";
import { formatDate } from "@/lib/format/dates";
import { parseInput } from "@/lib/http/parse-input";
import { mailAboutCase, recipients } from "./case-mail";
import { checkAssignment } from "./check-assignment";
import { PRIORITY_NAMES } from "./constants";
import { moveCase } from "./move-case";
import { AcceptCaseInput } from "./schemas";
import { assignmentColumns, writeTechnicians } from "./write-assignment";
import { writeCase } from "./write-case";

/**
 * Takes a case: priority, people, date and the statement that nobody named has a stake in it.
 * Opens issue 1 of the findings, and mails the requester and the people named.
 * @throws AppError INVALID for a seat or a date that does not hold
 */
export async function acceptCase(actor: Actor, raw: unknown): Promise<{ number: string | null }> {
  const input = parseInput(AcceptCaseInput, raw);
  return writeCase(actor, "case.accept", input.caseId, async (tx, { row }) => {
    const named = await checkAssignment(tx, row, input);
    await moveCase(tx, actor, row, "accept", {
      ...assignmentColumns(input),
      impartialityStatement: input.impartialityStatement,
      acceptedAt: new Date(),
    });
    await writeTechnicians(tx, row.id, input.technicianIds);
    await createFirstIssue(tx, actor, row.id);
    const due: [string, string] = ["Due", formatDate(input.dueOn)];
    await mailAboutCase(tx, await recipients(tx, [row.requesterId]), row, "accepted", {
      news: `The laboratory took the case. ${named.get(input.investigatorId)?.name ?? "The laboratory"} examines it.`,
      facts: [due],
    });
    const others = [...named.values()].filter(
      ({ id }) => id !== actor.id && id !== row.requesterId,
    );
    await mailAboutCase(tx, others, row, "you are on this case", {
      news: `${actor.name} accepted the case and named you for it.`,
      facts: [["Priority", PRIORITY_NAMES[input.priority]], due],
    });
    return { number: row.number };
  });
}
