"use server";

import { revalidatePath } from "next/cache";
import { action } from "@/lib/http/action";
import { WeighMechanismInput, WithdrawMechanismInput } from "@/lib/mechanisms/schemas";
import { weighMechanism } from "@/lib/mechanisms/weigh-mechanism";
import { withdrawMechanism } from "@/lib/mechanisms/withdraw-mechanism";
import { routes } from "@/lib/routes";

export const weigh = action(
  { permission: "mechanism.weigh", input: WeighMechanismInput },
  async (actor, input) => {
    const mechanism = await weighMechanism(actor, input);
    revalidatePath(routes.weighing(input.caseId));
    return mechanism;
  },
);

export const withdraw = action(
  { permission: "mechanism.weigh", input: WithdrawMechanismInput },
  async (actor, input) => {
    const mechanism = await withdrawMechanism(actor, input);
    revalidatePath(routes.weighing(input.caseId));
    return mechanism;
  },
);
