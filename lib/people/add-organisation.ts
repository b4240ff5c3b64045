import "server-only";
import { organisations } from "@/db/schema";
import { databaseErrorNumber, DUPLICATE_KEY, transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { newId } from "@/lib/new-id";
import { AddOrganisationInput } from "./schemas";

/** Adds a client organisation. @throws AppError INVALID when the name is taken */
export async function addOrganisation(
  actor: Actor,
  raw: unknown,
): Promise<{ organisationId: string }> {
  requireAllowed(actor, "person.invite");
  const { name } = parseInput(AddOrganisationInput, raw);
  const organisationId = newId("org");
  try {
    await transaction(async (tx) => {
      await tx.insert(organisations).values({ id: organisationId, kind: "client", name });
      await recordEvent(tx, {
        caseId: null,
        actor,
        action: "person.invite",
        subject: { kind: "organisation", id: organisationId, label: name },
        before: null,
        after: { name },
      });
    });
  } catch (error) {
    if (databaseErrorNumber(error) === DUPLICATE_KEY) {
      throw new AppError("INVALID", undefined, {
        fields: { name: "A client with this name is here already." },
      });
    }
    throw error;
  }
  return { organisationId };
}
