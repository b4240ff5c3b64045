import "server-only";
import { eq } from "drizzle-orm";
import { reportIssues } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { moveCase } from "@/lib/cases/move-case";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { findIssue } from "./find-issue";
import { mailInvestigator } from "./mail-investigator";
import { SendBackInput } from "./move-schemas";

/** Sends the findings back to be changed, with a note. */
export async function sendBack(actor: Actor, raw: unknown): Promise<void> {
  const input = parseInput(SendBackInput, raw);
  await writeCase(actor, "findings.sendBack", input.caseId, async (tx, { row }) => {
    const issue = await findIssue(tx, input.caseId, "lock");
    if (!issue) throw new AppError("LOCKED", "There is no open issue to send back.");
    await tx.update(reportIssues).set({ state: "drafting" }).where(eq(reportIssues.id, issue.id));
    await moveCase(tx, actor, row, "sendBack", {}, input.note);
    await mailInvestigator(tx, row, `${actor.name} sent the findings back.`, input.note);
  });
}
