import { route } from "@/lib/http/route";
import { storedFile } from "@/lib/http/stored-file";
import { getOriginal } from "@/lib/images/get-original";

/** The file as it was sent, byte for byte. */
export const GET = route<{ imageId: string }>(
  { permission: "case.viewWork" },
  async ({ actor, request, params }) => {
    const { key, mediaType, fileName } = await getOriginal(actor, params.imageId);
    return storedFile(request, {
      key,
      mediaType,
      saveAs: fileName,
      cacheControl: "private, no-cache",
    });
  },
);
