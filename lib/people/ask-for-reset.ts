import "server-only";
import { and, eq } from "drizzle-orm";
import { people } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import { takeTry } from "@/lib/auth/throttle";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { queueMail } from "@/lib/outbox/mail";
import { routes } from "@/lib/routes";
import { PASSWORD_RESET_VALID_HOURS } from "./constants";
import { makeToken } from "./person-token";
import { ForgottenInput } from "./schemas";

/** Mails a link for a new password. The answer is the same whether the account exists or not. */
export async function askForReset(raw: unknown, address: string): Promise<void> {
  const { email } = parseInput(ForgottenInput, raw);
  if (!(await takeTry(`reset:${email}`, address))) throw new AppError("TOO_MANY");
  await transaction(async (tx) => {
    const [person] = await tx
      .select()
      .from(people)
      .where(and(eq(people.email, email), eq(people.isActive, true)));
    if (!person) return;
    const token = await makeToken(tx, person.id, "password-reset");
    await queueMail(tx, {
      to: person.email,
      subject: "A new password for Riverline",
      news: "Someone, most likely you, asked for a new password.",
      facts: [],
      button: { label: "Choose a new password", path: routes.setPassword(token) },
      after: `The link works once, for ${PASSWORD_RESET_VALID_HOURS} hours. If it was not you, do nothing; your password stays as it is.`,
    });
    await recordEvent(tx, {
      caseId: null,
      actor: null,
      action: "system.password",
      subject: { kind: "person", id: person.id, label: person.name },
      before: null,
      after: { asked: true },
    });
  });
}
