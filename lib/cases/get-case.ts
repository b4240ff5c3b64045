import "server-only";
import { database } from "@/db/client";
import type { Actor } from "@/lib/auth/actor";
import type { Action } from "@/lib/auth/policy";
import { requireAllowed } from "@/lib/auth/require";
import { notFound } from "@/lib/errors";
import { findCase, type LoadedCase } from "./subject";

/**
 * A case for reading, after asking the policy for `action`.
 * @throws AppError NOT_FOUND when it is not there or not this person's to see.
 */
export async function getCase(actor: Actor, action: Action, caseId: string): Promise<LoadedCase> {
  const found = await findCase(database(), caseId);
  if (!found) throw notFound();
  requireAllowed(actor, action, found.subject);
  return found;
}
