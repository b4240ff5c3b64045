"use server";

import { revalidatePath } from "next/cache";
import { action } from "@/lib/http/action";
import { routes } from "@/lib/routes";
import { StateStrengthInput } from "@/lib/strength/schemas";
import { stateStrength } from "@/lib/strength/state-strength";

export const state = action(
  { permission: "strength.state", input: StateStrengthInput },
  async (actor, input) => {
    const statement = await stateStrength(actor, input);
    revalidatePath(routes.strength(input.caseId));
    return statement;
  },
);
