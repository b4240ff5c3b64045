import "server-only";
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { people } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import { PASSWORD_MAX_LENGTH } from "@/lib/people/constants";
import { verifyPassword } from "./password";
import { forgetTry, takeTry } from "./throttle";

export const THROTTLED = "THROTTLED";

/**
 * The active person with this e-mail and password, or null. Records the sign-in.
 * @throws Error THROTTLED after too many failed tries for the account or the address
 */
export async function checkPassword(
  email: string,
  password: string,
  address: string,
): Promise<{ id: string; signInEpoch: number } | null> {
  const [person] = await database().select().from(people).where(eq(people.email, email.trim()));
  // The database takes accents and capitals for the same letter, so the account is named as kept.
  const account = person?.email ?? email;
  if (!(await takeTry(account, address))) throw new Error(THROTTLED);
  const fits =
    password.length <= PASSWORD_MAX_LENGTH &&
    (await verifyPassword(person?.isActive ? person.passwordHash : null, password));
  if (!fits || !person) return null;
  await forgetTry(account, address);
  await transaction((tx) =>
    recordEvent(tx, {
      caseId: null,
      actor: person,
      action: "system.signIn",
      subject: { kind: "person", id: person.id, label: person.name },
      before: null,
      after: null,
    }),
  );
  return person;
}
