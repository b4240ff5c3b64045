import "server-only";
import { AppError, notFound } from "@/lib/errors";
import type { Actor } from "./actor";
import { type Action, type CaseSubject, decide } from "./policy";

const CODE = {
  role: "NOT_ALLOWED",
  relation: "NOT_ALLOWED",
  state: "LOCKED",
  condition: "NOT_ALLOWED",
} as const;

/**
 * Passes when the policy allows it.
 * @throws AppError NOT_FOUND when the person may not even see the case, NOT_ALLOWED or LOCKED with
 * the sentence of the policy when they see it and may not do this.
 */
export function requireAllowed(actor: Actor, action: Action, subject?: CaseSubject): void {
  const decision = decide(actor, action, subject);
  if (decision.allowed) return;
  if (subject && !decide(actor, "case.view", subject).allowed) throw notFound();
  throw new AppError(CODE[decision.because], decision.says);
}
