import { route } from "@/lib/http/route";
import { storedFile } from "@/lib/http/stored-file";
import { getRequestFile } from "@/lib/uploads/request-files";
import { withdrawRequestFile } from "@/lib/uploads/withdraw-request-file";

/** A photograph or paper of a field return, as it was sent. */
export const GET = route<{ fileId: string }>(
  { permission: "case.viewFieldReturn" },
  async ({ actor, request, params }) => {
    const { key, mediaType, fileName } = await getRequestFile(actor, params.fileId);
    return storedFile(request, {
      key,
      mediaType,
      saveAs: fileName,
      cacheControl: "private, no-cache",
    });
  },
);

/** Takes it off the field return. */
export const DELETE = route<{ fileId: string }>(
  { permission: "case.addRequestFile" },
  async ({ actor, params }) => {
    await withdrawRequestFile(actor, params.fileId);
    return new Response(null, { status: 204 });
  },
);
