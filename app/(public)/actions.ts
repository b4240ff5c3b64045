"use server";

import { headers } from "next/headers";
import { addressOf } from "@/lib/auth/throttle";
import { openAction } from "@/lib/http/action";
import { askForReset } from "@/lib/people/ask-for-reset";
import { ForgottenInput, SetPasswordInput, SetUpInput } from "@/lib/people/schemas";
import { setPasswordWithToken } from "@/lib/people/set-password";
import { setUp } from "@/lib/people/set-up";

export const askForNewPassword = openAction({ input: ForgottenInput }, async (input) => {
  await askForReset(input, addressOf(Object.fromEntries(await headers())));
});

export const choosePassword = openAction({ input: SetPasswordInput }, (input) =>
  setPasswordWithToken(input),
);

export const setUpRiverline = openAction({ input: SetUpInput }, async (input) => {
  await setUp(input);
  return { email: input.email };
});
