import { jsonBody, route } from "@/lib/http/route";
import { listUnfinished } from "@/lib/uploads/get-upload";
import { StartUploadInput } from "@/lib/uploads/schemas";
import { startUpload } from "@/lib/uploads/start-upload";

/** Starts to take a file in, or goes on with the same one: where to send its bytes. */
export const POST = route({ permission: "case.addRequestFile" }, async ({ actor, request }) =>
  Response.json(await startUpload(actor, await jsonBody(request, StartUploadInput)), {
    status: 201,
  }),
);

/** Files of this person's own that are on their way: ?caseId=…&purpose=… */
export const GET = route({ permission: "case.addRequestFile" }, async ({ actor, request }) => {
  const query = Object.fromEntries(new URL(request.url).searchParams);
  return Response.json({ uploads: await listUnfinished(actor, query) });
});
