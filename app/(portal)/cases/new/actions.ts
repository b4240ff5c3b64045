"use server";

import { createDraft } from "@/lib/cases/create-draft";
import { CreateDraftInput } from "@/lib/cases/schemas";
import { action } from "@/lib/http/action";

export const startFieldReturn = action(
  { permission: "case.create", input: CreateDraftInput },
  (actor, input) => createDraft(actor, input),
);
