"use server";

import { cookies } from "next/headers";
import { redirect } from "next/navigation";
import { endSignIn } from "@/lib/auth/sign-ins";
import { currentSignInId } from "@/lib/auth/session";
import { action } from "@/lib/http/action";
import { routes } from "@/lib/routes";
import { z } from "zod";

const endSession = action({ permission: "self.view", input: z.undefined() }, async () => {
  const signInId = await currentSignInId();
  if (signInId) await endSignIn(signInId);
});

/** Ends this sign-in everywhere and forgets the cookie. */
export async function signOut(): Promise<void> {
  await endSession(undefined);
  const jar = await cookies();
  for (const { name } of jar.getAll()) if (name.includes("next-auth")) jar.delete(name);
  redirect(routes.signIn());
}
