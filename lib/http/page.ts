import "server-only";
import { headers } from "next/headers";
import { notFound, redirect } from "next/navigation";
import type { Actor } from "@/lib/auth/actor";
import { type Action, decide } from "@/lib/auth/policy";
import { currentActor } from "@/lib/auth/session";
import { AppError } from "@/lib/errors";
import { routes } from "@/lib/routes";

/** The signed-in person of a page whose rule is `permission`; sends others to sign in. */
export async function pageActor(permission: Action): Promise<Actor> {
  const actor = await currentActor();
  if (!actor) redirect(routes.signIn((await headers()).get("x-riverline-path") ?? undefined));
  const decision = decide(actor, permission);
  if (!decision.allowed && decision.because === "role") notFound();
  return actor;
}

/** Marks a page that needs no sign-in, so that nothing is open by oversight. */
export function openPage(): void {}

/** Reads for a page: what is not there and what is not theirs give the same page. */
export async function orNotFound<T>(read: Promise<T>): Promise<T> {
  try {
    return await read;
  } catch (error) {
    if (error instanceof AppError && (error.code === "NOT_FOUND" || error.code === "NOT_ALLOWED"))
      notFound();
    throw error;
  }
}
