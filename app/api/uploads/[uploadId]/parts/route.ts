import { jsonBody, route } from "@/lib/http/route";
import { reportParts } from "@/lib/uploads/report-parts";
import { ReportPartsInput } from "@/lib/uploads/schemas";

/** Notes parts that the store has taken and gives addresses for the next ones. */
export const POST = route<{ uploadId: string }>(
  { permission: "case.addRequestFile" },
  async ({ actor, request, params }) =>
    Response.json(
      await reportParts(actor, params.uploadId, await jsonBody(request, ReportPartsInput)),
    ),
);
