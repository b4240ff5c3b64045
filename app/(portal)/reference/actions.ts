"use server";

import { revalidatePath } from "next/cache";
import { action } from "@/lib/http/action";
import { SwitchTableInput } from "@/lib/reference/schemas";
import { switchTable } from "@/lib/reference/switch-table";
import { routes } from "@/lib/routes";

export const turn = action(
  { permission: "reference.switch", input: SwitchTableInput },
  async (actor, input) => {
    const switched = await switchTable(actor, input);
    revalidatePath(routes.reference(), "layout");
    return switched;
  },
);
