import "server-only";
import { eq } from "drizzle-orm";
import { organisations, people } from "@/db/schema";
import { databaseErrorNumber, DUPLICATE_KEY, transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { newId } from "@/lib/new-id";
import { queueMail } from "@/lib/outbox/mail";
import { routes } from "@/lib/routes";
import { INVITATION_VALID_HOURS, ROLE_NAMES } from "./constants";
import { makeToken } from "./person-token";
import { InvitePersonInput, roleFits } from "./schemas";

/**
 * Adds a person and mails an invitation to choose a password.
 * @throws AppError INVALID when the e-mail is taken or the role does not fit the organisation
 */
export async function invitePerson(actor: Actor, raw: unknown): Promise<{ personId: string }> {
  requireAllowed(actor, "person.invite");
  const input = parseInput(InvitePersonInput, raw);
  const personId = newId("per");
  try {
    await transaction(async (tx) => {
      const [organisation] = await tx
        .select()
        .from(organisations)
        .where(eq(organisations.id, input.organisationId));
      if (!organisation)
        throw new AppError("INVALID", undefined, {
          fields: { organisationId: "Choose an organisation." },
        });
      if (!roleFits(input.role, organisation.kind)) {
        throw new AppError("INVALID", undefined, {
          fields: { role: "A client's people can only be requesters." },
        });
      }
      await tx.insert(people).values({
        id: personId,
        organisationId: organisation.id,
        email: input.email,
        name: input.name,
        role: input.role,
      });
      const token = await makeToken(tx, personId, "invitation");
      await queueMail(tx, {
        to: input.email,
        subject: "Your invitation to Riverline",
        news: `${actor.name} invites you to Riverline as ${ROLE_NAMES[input.role].toLowerCase()} of ${organisation.name}.`,
        facts: [["Your e-mail", input.email]],
        button: { label: "Choose a password", path: routes.setPassword(token) },
        after: `The link works once, for ${INVITATION_VALID_HOURS} hours.`,
      });
      await recordEvent(tx, {
        caseId: null,
        actor,
        action: "person.invite",
        subject: { kind: "person", id: personId, label: input.name },
        before: null,
        after: {
          name: input.name,
          email: input.email,
          role: input.role,
          organisation: organisation.name,
        },
      });
    });
  } catch (error) {
    if (databaseErrorNumber(error) === DUPLICATE_KEY) {
      throw new AppError("INVALID", undefined, {
        fields: { email: "Someone with this e-mail is here already." },
      });
    }
    throw error;
  }
  return { personId };
}
