import { notFound } from "@/lib/errors";
import { requestOrigin } from "@/lib/http/request-origin";
import { route } from "@/lib/http/route";
import { IMMUTABLE, storedFile } from "@/lib/http/stored-file";
import { infoJson, tilePath } from "@/lib/images/iiif";
import { openTiles } from "@/lib/images/tile-access";
import { routes } from "@/lib/routes";

/** IIIF Image API 3, level 0: info.json and the tiles of a picture. */
export const GET = route<{ imageId: string; path: string[] }>(
  { permission: "case.viewFieldReturn" },
  async ({ actor, request, params }) => {
    const source = await openTiles(actor, params.imageId);
    const path = params.path.join("/").replaceAll(/%2c/gi, ",");
    if (path === "info.json") {
      const id = new URL(routes.api.imageService(params.imageId), requestOrigin(request));
      return Response.json(infoJson(id.toString(), source), {
        headers: {
          "content-type": 'application/ld+json;profile="http://iiif.io/api/image/3/context.json"',
          "cache-control": "private, no-cache",
        },
      });
    }
    const tile = tilePath(path, source);
    if (tile === null) throw notFound();
    return storedFile(request, {
      key: `${source.prefix}/${tile}`,
      mediaType: "image/jpeg",
      cacheControl: IMMUTABLE,
    });
  },
);
