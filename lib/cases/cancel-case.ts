import "server-only";
import type { Actor } from "@/lib/auth/actor";
import { parseInput } from "@/lib/http/parse-input";
import { mailAboutCase, recipients, triagePeople } from "./case-mail";
import { moveCase } from "./move-case";
import { CancelCaseInput } from "./schemas";
import { writeCase } from "./write-case";

/** Ends a request before it is accepted. Nobody hears of a draft that was never sent. */
export async function cancelCase(actor: Actor, raw: unknown): Promise<void> {
  const { caseId, reason } = parseInput(CancelCaseInput, raw);
  await writeCase(actor, "case.cancel", caseId, async (tx, { row }) => {
    await moveCase(tx, actor, row, "cancel", { endReason: reason }, reason);
    if (row.state === "draft") return;
    const told = [...(await recipients(tx, [row.requesterId])), ...(await triagePeople(tx))];
    const others = [...new Map(told.map((person) => [person.id, person])).values()].filter(
      ({ id }) => id !== actor.id,
    );
    await mailAboutCase(tx, others, row, "cancelled", {
      news: `${actor.name} cancelled the request.`,
      facts: [["Reason", reason]],
    });
  });
}
