import "server-only";
import { caseQuestions } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { parseInput } from "@/lib/http/parse-input";
import { newId } from "@/lib/new-id";
import { routes } from "@/lib/routes";
import { mailAboutCase, recipients } from "./case-mail";
import { moveCase } from "./move-case";
import { AskBackInput } from "./schemas";
import { writeCase } from "./write-case";

/** Asks the requester; the case waits until every question is answered. */
export async function askBack(actor: Actor, raw: unknown): Promise<{ questionIds: string[] }> {
  const input = parseInput(AskBackInput, raw);
  return writeCase(actor, "case.askBack", input.caseId, async (tx, { row }) => {
    await moveCase(tx, actor, row, "askBack");
    const asked = input.questions.map((question) => ({
      id: newId("qst"),
      caseId: row.id,
      question,
      askedById: actor.id,
    }));
    await tx.insert(caseQuestions).values(asked);
    for (const { id, question } of asked) {
      await recordEvent(tx, {
        caseId: row.id,
        actor,
        action: "case.askBack",
        subject: { kind: "question", id, label: row.number ?? "Draft" },
        before: null,
        after: { question },
      });
    }
    await mailAboutCase(tx, await recipients(tx, [row.requesterId]), row, "a question for you", {
      news: `${actor.name} asks:\n${input.questions.join("\n")}`,
      button: { label: "Answer", path: routes.fieldReturn(row.id) },
      after: "The case waits for your answer.",
    });
    return { questionIds: asked.map(({ id }) => id) };
  });
}
