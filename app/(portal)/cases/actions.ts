"use server";

import { revalidatePath } from "next/cache";
import { dropView, saveView } from "@/lib/cases/saved-views";
import { DropViewInput, SaveViewInput } from "@/lib/cases/view-schemas";
import { action } from "@/lib/http/action";
import { routes } from "@/lib/routes";

export const keepView = action(
  { permission: "view.save", input: SaveViewInput },
  async (actor, input) => {
    const view = await saveView(actor, input);
    revalidatePath(routes.cases());
    return view;
  },
);

export const dropSavedView = action(
  { permission: "view.save", input: DropViewInput },
  async (actor, input) => {
    await dropView(actor, input);
    revalidatePath(routes.cases());
  },
);
