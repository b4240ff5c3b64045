import "server-only";
import type { Actor } from "@/lib/auth/actor";
import { parseInput } from "@/lib/http/parse-input";
import { mailAboutCase, recipients } from "./case-mail";
import { moveCase } from "./move-case";
import { DeclineCaseInput } from "./schemas";
import { writeCase } from "./write-case";

/** Ends a case that the laboratory does not take, and mails the reason to the requester. */
export async function declineCase(actor: Actor, raw: unknown): Promise<void> {
  const { caseId, reason } = parseInput(DeclineCaseInput, raw);
  await writeCase(actor, "case.decline", caseId, async (tx, { row }) => {
    await moveCase(tx, actor, row, "decline", { endReason: reason }, reason);
    await mailAboutCase(tx, await recipients(tx, [row.requesterId]), row, "declined", {
      news: "The laboratory does not take this case.",
      facts: [["Reason", reason]],
      after: "What you sent is kept. Parts that arrived are sent back to you.",
    });
  });
}
