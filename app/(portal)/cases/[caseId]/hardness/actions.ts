"use server";

import { revalidatePath } from "next/cache";
import { action } from "@/lib/http/action";
import { routes } from "@/lib/routes";
import { createTraverse } from "@/lib/traverses/create-traverse";
import { restoreTraverse } from "@/lib/traverses/restore-traverse";
import { saveTraverse } from "@/lib/traverses/save-traverse";
import {
  CreateTraverseInput,
  RestoreTraverseInput,
  SaveTraverseInput,
  WithdrawTraverseInput,
} from "@/lib/traverses/schemas";
import { withdrawTraverse } from "@/lib/traverses/withdraw-traverse";

export const create = action(
  { permission: "traverse.record", input: CreateTraverseInput },
  async (actor, input) => {
    const saved = await createTraverse(actor, input);
    revalidatePath(routes.hardness(input.caseId), "layout");
    return saved;
  },
);

export const save = action(
  { permission: "traverse.record", input: SaveTraverseInput },
  async (actor, input) => {
    const saved = await saveTraverse(actor, input);
    revalidatePath(routes.case(input.caseId), "layout");
    return saved;
  },
);

export const withdraw = action(
  { permission: "traverse.record", input: WithdrawTraverseInput },
  async (actor, input) => {
    const withdrawn = await withdrawTraverse(actor, input);
    revalidatePath(routes.case(input.caseId), "layout");
    return withdrawn;
  },
);

export const restore = action(
  { permission: "traverse.record", input: RestoreTraverseInput },
  async (actor, input) => {
    const restored = await restoreTraverse(actor, input);
    revalidatePath(routes.case(input.caseId), "layout");
    return restored;
  },
);
