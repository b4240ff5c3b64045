import { route } from "@/lib/http/route";
import { cancelUpload } from "@/lib/uploads/cancel-upload";
import { getUpload } from "@/lib/uploads/get-upload";

/** Where a file stands. */
export const GET = route<{ uploadId: string }>(
  { permission: "case.addRequestFile" },
  async ({ actor, params }) => Response.json(await getUpload(actor, params.uploadId)),
);

/** Gives up a file that is being sent, or puts the notice of a refused one away. */
export const DELETE = route<{ uploadId: string }>(
  { permission: "case.addRequestFile" },
  async ({ actor, params }) => {
    await cancelUpload(actor, params.uploadId);
    return new Response(null, { status: 204 });
  },
);
