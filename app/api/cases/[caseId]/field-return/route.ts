import { z } from "zod";
import { saveDraft } from "@/lib/cases/save-draft";
import { AppError } from "@/lib/errors";
import { rawJson, route } from "@/lib/http/route";
import { DRAFT_MAX_BYTES } from "@/lib/intake/constants";

const body = z.record(z.string(), z.unknown());

/** Keeps the field return as it is typed, right or wrong. */
export const PUT = route<{ caseId: string }>(
  { permission: "case.create" },
  async ({ actor, request, params }) => {
    const sent = body.safeParse(await rawJson(request, DRAFT_MAX_BYTES));
    if (!sent.success)
      throw new AppError("INVALID", "This is not a field return. Nothing was saved.");
    return Response.json(await saveDraft(actor, { ...sent.data, caseId: params.caseId }));
  },
);
