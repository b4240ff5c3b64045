import "server-only";
import { and, eq, isNull, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { database } from "@/db/client";
import { people, personTokens } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { hashPassword, verifyPassword } from "@/lib/auth/password";
import { requireAllowed } from "@/lib/auth/require";
import { forgetFailures } from "@/lib/auth/throttle";
import { sha256Hex } from "@/lib/canonical-json";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { findToken } from "./person-token";
import { ChangeOwnPasswordInput, SetPasswordInput } from "./schemas";

const LINK_USED =
  "This link has been used or is too old. Nothing was changed. Ask for a new one with “Forgotten it?”.";

async function store(
  tx: Transaction,
  person: { id: string; name: string; role: Actor["role"] },
  passwordHash: string,
) {
  await tx
    .update(people)
    .set({ passwordHash, signInEpoch: sql`${people.signInEpoch} + 1` })
    .where(eq(people.id, person.id));
  // Links mailed before would let an old message change the password that was chosen since.
  await tx
    .update(personTokens)
    .set({ usedAt: new Date() })
    .where(and(eq(personTokens.personId, person.id), isNull(personTokens.usedAt)));
  await recordEvent(tx, {
    caseId: null,
    actor: person,
    action: "system.password",
    subject: { kind: "person", id: person.id, label: person.name },
    before: null,
    after: null,
  });
}

/** Sets a password with a mailed link; it works once. @throws AppError NOT_ALLOWED on a spent link */
export async function setPasswordWithToken(raw: unknown): Promise<{ email: string }> {
  const input = parseInput(SetPasswordInput, raw);
  const found = await findToken(input.token);
  if (!found) throw new AppError("NOT_ALLOWED", LINK_USED);
  const passwordHash = await hashPassword(input.password);
  await transaction(async (tx) => {
    const [result] = await tx
      .update(personTokens)
      .set({ usedAt: new Date() })
      .where(and(eq(personTokens.digest, sha256Hex(input.token)), isNull(personTokens.usedAt)));
    const [person] = await tx
      .select()
      .from(people)
      .where(eq(people.id, found.personId))
      .for("update");
    if (result.affectedRows !== 1 || !person) throw new AppError("NOT_ALLOWED", LINK_USED);
    await store(tx, person, passwordHash);
  });
  await forgetFailures(found.email);
  return { email: found.email };
}

/** Changes one's own password; every sign-in of this person ends. */
export async function changeOwnPassword(actor: Actor, raw: unknown): Promise<void> {
  requireAllowed(actor, "self.view");
  const input = parseInput(ChangeOwnPasswordInput, raw);
  const [person] = await database().select().from(people).where(eq(people.id, actor.id));
  if (!person || !(await verifyPassword(person.passwordHash, input.current))) {
    throw new AppError("INVALID", undefined, {
      fields: { current: "This is not your present password." },
    });
  }
  const passwordHash = await hashPassword(input.password);
  await transaction((tx) => store(tx, person, passwordHash));
}
