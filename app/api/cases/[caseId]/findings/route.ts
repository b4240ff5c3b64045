import { z } from "zod";
import { AppError } from "@/lib/errors";
import { DOCUMENT_MAX_BYTES } from "@/lib/findings/document-schema";
import { saveFindings } from "@/lib/findings/save-findings";
import { rawJson, route } from "@/lib/http/route";

const body = z.record(z.string(), z.unknown());

/** Saves the draft of the findings as it is typed. */
export const PUT = route<{ caseId: string }>(
  { permission: "findings.write" },
  async ({ actor, request, params }) => {
    const sent = body.safeParse(await rawJson(request, DOCUMENT_MAX_BYTES));
    if (!sent.success)
      throw new AppError("INVALID", "This is not a draft of findings. Nothing was saved.");
    return Response.json(await saveFindings(actor, { ...sent.data, caseId: params.caseId }));
  },
);
