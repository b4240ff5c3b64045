import { jsonBody, route } from "@/lib/http/route";
import { finishUpload } from "@/lib/uploads/finish-upload";
import { FinishUploadInput } from "@/lib/uploads/schemas";

/** Ends the sending of a file; it is looked into next. */
export const POST = route<{ uploadId: string }>(
  { permission: "case.addRequestFile" },
  async ({ actor, request, params }) =>
    Response.json(
      await finishUpload(actor, params.uploadId, await jsonBody(request, FinishUploadInput)),
    ),
);
