import { route } from "@/lib/http/route";
import { IMMUTABLE, storedFile } from "@/lib/http/stored-file";
import { THUMBNAIL_NAME } from "@/lib/images/thumbnail";
import { openTiles } from "@/lib/images/tile-access";

/** A picture of at most 320 pixels on its longer side. */
export const GET = route<{ imageId: string }>(
  { permission: "case.viewFieldReturn" },
  async ({ actor, request, params }) => {
    const { prefix } = await openTiles(actor, params.imageId);
    return storedFile(request, {
      key: `${prefix}/${THUMBNAIL_NAME}`,
      mediaType: "image/jpeg",
      cacheControl: IMMUTABLE,
    });
  },
);
