import "server-only";
import { unstable_rethrow } from "next/navigation";
import type { z } from "zod";
import type { Actor } from "@/lib/auth/actor";
import { type Action, decide, OPEN_TO_ALL } from "@/lib/auth/policy";
import { currentActor } from "@/lib/auth/session";
import { AppError, type Conflict, type ErrorCode, type FieldErrors } from "@/lib/errors";
import { parseInput } from "./parse-input";
import { explain } from "./explain";

export type ActionError = {
  code: ErrorCode;
  message: string;
  fields?: FieldErrors;
  conflict?: Conflict;
  /** Short number under which an unexpected failure stands in the log. */
  id?: string;
};
export type ActionResult<T> = { ok: true; value: T } | { ok: false; error: ActionError };

/** Whether the rule could allow this person at all; the verb asks again with the case. */
export function requireRole(actor: Actor, permission: Action): void {
  const decision = decide(actor, permission);
  if (!decision.allowed && decision.because === "role")
    throw new AppError("NOT_ALLOWED", decision.says);
}

/**
 * Builds a server action: signed in, role, schema, then `run`. Errors come back as words.
 * Every exported action is made here; `permission` names its rule in the policy table.
 */
export function action<S extends z.ZodType, T>(
  def: { permission: Action; input: S },
  run: (actor: Actor, input: z.output<S>) => Promise<T>,
): ((raw: z.input<S>) => Promise<ActionResult<T>>) & { permission: Action } {
  const act = async (raw: z.input<S>): Promise<ActionResult<T>> => {
    try {
      const actor = await currentActor();
      if (!actor) throw new AppError("NOT_SIGNED_IN");
      requireRole(actor, def.permission);
      return { ok: true, value: await run(actor, parseInput(def.input, raw)) };
    } catch (error) {
      unstable_rethrow(error);
      return { ok: false, error: explain(error) };
    }
  };
  return Object.assign(act, { permission: def.permission });
}

/** An action for people who are not signed in: invitations, forgotten passwords, set-up. */
export function openAction<S extends z.ZodType, T>(
  def: { input: S },
  run: (input: z.output<S>) => Promise<T>,
): ((raw: z.input<S>) => Promise<ActionResult<T>>) & { permission: typeof OPEN_TO_ALL } {
  const act = async (raw: z.input<S>): Promise<ActionResult<T>> => {
    try {
      return { ok: true, value: await run(parseInput(def.input, raw)) };
    } catch (error) {
      unstable_rethrow(error);
      return { ok: false, error: explain(error) };
    }
  };
  return Object.assign(act, { permission: OPEN_TO_ALL });
}
