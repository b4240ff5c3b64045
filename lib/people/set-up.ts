import "server-only";
import type { Transaction } from "@/db/client";
import { organisations, people, settings } from "@/db/schema";
import { databaseErrorNumber, DUPLICATE_KEY, transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import { hashPassword } from "@/lib/auth/password";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { newId } from "@/lib/new-id";
import { FIRST_ROLE } from "./constants";
import { SetUpInput } from "./schemas";

/** Writes the laboratory and its first administrator into an empty installation, once. */
export async function setUp(raw: unknown): Promise<void> {
  const input = parseInput(SetUpInput, raw);
  const passwordHash = await hashPassword(input.password);
  await transaction(async (tx) => {
    // Two people at the set-up page at once: the second waits here until the first is done.
    await claim(tx);
    const [someone] = await tx.select({ id: organisations.id }).from(organisations).limit(1);
    if (someone) throw alreadySetUp();
    const organisationId = newId("org");
    const person = { id: newId("per"), name: input.name, role: FIRST_ROLE };
    await tx.insert(organisations).values({
      id: organisationId,
      kind: "laboratory",
      name: input.laboratoryName,
      addressLine: input.addressLine || null,
    });
    await tx.insert(people).values({ ...person, organisationId, email: input.email, passwordHash });
    await recordEvent(tx, {
      caseId: null,
      actor: person,
      action: "system.setUp",
      subject: { kind: "organisation", id: organisationId, label: input.laboratoryName },
      before: null,
      after: { laboratory: input.laboratoryName, administrator: input.email },
    });
  });
}

const alreadySetUp = () => new AppError("LOCKED", "Riverline is set up already. Sign in instead.");

/** A row of its own that only one transaction can write; it is gone when that one fails. */
async function claim(tx: Transaction): Promise<void> {
  try {
    await tx.insert(settings).values({ name: "set-up", value: true });
  } catch (error) {
    if (databaseErrorNumber(error) === DUPLICATE_KEY) throw alreadySetUp();
    throw error;
  }
}
