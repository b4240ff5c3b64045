import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { people } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { hashPassword } from "@/lib/auth/password";
import { startSignIn } from "@/lib/auth/sign-ins";
import { routes } from "@/lib/routes";
import type { QueuedMail } from "./mails";

export async function personRow(id: string) {
  const [row] = await database().select().from(people).where(eq(people.id, id));
  if (!row) throw new Error(`there is no person ${id}`);
  return row;
}

export async function personByEmail(email: string) {
  const [row] = await database().select().from(people).where(eq(people.email, email));
  return row ?? null;
}

export async function givePassword(person: Pick<Actor, "id">, password: string): Promise<void> {
  const passwordHash = await hashPassword(password);
  await database().update(people).set({ passwordHash }).where(eq(people.id, person.id));
}

/** A sign-in of this person as they are now. */
export async function signInOf(person: Pick<Actor, "id">): Promise<string> {
  return startSignIn(await personRow(person.id));
}

/** The token in the link of a message. */
export function tokenIn(mail: QueuedMail | undefined): string {
  const path = mail?.button?.path ?? "";
  const before = routes.setPassword("");
  if (!path.startsWith(before)) throw new Error(`the message has no such link: ${path}`);
  return path.slice(before.length);
}
