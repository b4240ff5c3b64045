import "server-only";
import { and, eq, ne, sql } from "drizzle-orm";
import { organisations, people } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import { AppError, notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { ChangePersonInput, roleFits } from "./schemas";

/**
 * Changes a person's role or activity. It takes effect at that person's next request: their
 * sign-ins end. Nobody changes themselves, and an active administrator always remains.
 */
export async function changePerson(actor: Actor, raw: unknown): Promise<void> {
  requireAllowed(actor, "person.change");
  const input = parseInput(ChangePersonInput, raw);
  if (input.personId === actor.id) {
    throw new AppError(
      "NOT_ALLOWED",
      "You cannot change your own role or activity. Ask another administrator.",
    );
  }
  await transaction(async (tx) => {
    const [person] = await tx
      .select()
      .from(people)
      .where(eq(people.id, input.personId))
      .for("update");
    if (!person) throw notFound();
    const [organisation] = await tx
      .select()
      .from(organisations)
      .where(eq(organisations.id, person.organisationId));
    if (!organisation || !roleFits(input.role, organisation.kind)) {
      throw new AppError("INVALID", undefined, {
        fields: { role: "A client's people can only be requesters." },
      });
    }
    if (person.role === actor.role && (input.role !== person.role || !input.isActive)) {
      const others = await tx
        .select({ id: people.id })
        .from(people)
        .where(
          and(eq(people.role, actor.role), eq(people.isActive, true), ne(people.id, person.id)),
        )
        .for("update");
      if (others.length === 0)
        throw new AppError(
          "NOT_ALLOWED",
          "This is the last active administrator. Nothing was changed.",
        );
    }
    await tx
      .update(people)
      .set({
        role: input.role,
        isActive: input.isActive,
        signInEpoch: sql`${people.signInEpoch} + 1`,
      })
      .where(eq(people.id, person.id));
    await recordEvent(tx, {
      caseId: null,
      actor,
      action: "person.change",
      subject: { kind: "person", id: person.id, label: person.name },
      before: { role: person.role, isActive: person.isActive },
      after: { role: input.role, isActive: input.isActive },
    });
  });
}
