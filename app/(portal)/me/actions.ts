"use server";

import { action } from "@/lib/http/action";
import { ChangeOwnPasswordInput } from "@/lib/people/schemas";
import { changeOwnPassword } from "@/lib/people/set-password";

export const changePassword = action(
  { permission: "self.view", input: ChangeOwnPasswordInput },
  (actor, input) => changeOwnPassword(actor, input),
);
