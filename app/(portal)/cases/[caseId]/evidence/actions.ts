"use server";

import { revalidatePath } from "next/cache";
import { describeItem } from "@/lib/evidence/describe-item";
import { handOver } from "@/lib/evidence/hand-over";
import { registerItem } from "@/lib/evidence/register-item";
import { DescribeItemInput, HandOverInput, RegisterItemInput } from "@/lib/evidence/schemas";
import { action } from "@/lib/http/action";
import { routes } from "@/lib/routes";

export const register = action(
  { permission: "evidence.register", input: RegisterItemInput },
  async (actor, input) => {
    const item = await registerItem(actor, input);
    revalidatePath(routes.evidence(input.caseId));
    return item;
  },
);

export const describe = action(
  { permission: "evidence.register", input: DescribeItemInput },
  async (actor, input) => {
    const described = await describeItem(actor, input);
    revalidatePath(routes.evidence(input.caseId));
    return described;
  },
);

export const writeEntry = action(
  { permission: "evidence.handOver", input: HandOverInput },
  async (actor, input) => {
    const entry = await handOver(actor, input);
    revalidatePath(routes.evidence(input.caseId));
    return entry;
  },
);
