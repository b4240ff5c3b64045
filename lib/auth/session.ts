import "server-only";
import { cache } from "react";
import { headers } from "next/headers";
import { getServerSession } from "next-auth";
import type { Actor } from "./actor";
import { authOptions } from "./options";
import { findSignIn, type SignInDeadlines } from "./sign-ins";

/** Set by background polling, which does not count as use. */
export const BACKGROUND_HEADER = "x-riverline-background";

const currentSignIn = cache(
  async (): Promise<{ actor: Actor; signInId: string; deadlines: SignInDeadlines } | null> => {
    const session = await getServerSession(authOptions());
    if (!session?.signInId) return null;
    const isBackground = (await headers()).get(BACKGROUND_HEADER) !== null;
    const found = await findSignIn(session.signInId, { countsAsUse: !isBackground });
    return found ? { ...found, signInId: session.signInId } : null;
  },
);

/** The person behind this request as the database has them now, or null. */
export async function currentActor(): Promise<Actor | null> {
  return (await currentSignIn())?.actor ?? null;
}

/** When this sign-in ends, for the warning before; null when signed out. */
export async function currentDeadlines(): Promise<SignInDeadlines | null> {
  return (await currentSignIn())?.deadlines ?? null;
}

export async function currentSignInId(): Promise<string | null> {
  return (await currentSignIn())?.signInId ?? null;
}
