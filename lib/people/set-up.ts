import "server-only";
import { sql } from "drizzle-orm";
import { organisations, people } from "@/db/schema";
import { transaction } from "@/db/transaction";
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
    // Two people at the set-up page at once: the second waits here, then finds it done.
    await tx.execute(sql`select get_lock('riverline-set-up', 10)`);
    try {
      const [someone] = await tx.select({ id: organisations.id }).from(organisations).limit(1);
      if (someone) throw new AppError("LOCKED", "Riverline is set up already. Sign in instead.");
      const organisationId = newId("org");
      const person = { id: newId("per"), name: input.name, role: FIRST_ROLE };
      await tx.insert(organisations).values({
        id: organisationId,
        kind: "laboratory",
        name: input.laboratoryName,
        addressLine: input.addressLine || null,
      });
      await tx
        .insert(people)
        .values({ ...person, organisationId, email: input.email, passwordHash });
      await recordEvent(tx, {
        caseId: null,
        actor: person,
        action: "system.setUp",
        subject: { kind: "organisation", id: organisationId, label: input.laboratoryName },
        before: null,
        after: { laboratory: input.laboratoryName, administrator: input.email },
      });
    } finally {
      await tx.execute(sql`select release_lock('riverline-set-up')`);
    }
  });
}
