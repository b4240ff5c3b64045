import { sha256Hex } from "@/lib/canonical-json";
import { route } from "@/lib/http/route";
import { getFigure } from "@/lib/images/figure";

/** A picture with its scale bar and marks, as a report shows it; `?marks=none` leaves the marks out. */
export const GET = route<{ imageId: string }>(
  { permission: "case.viewWork" },
  async ({ actor, request, params }) => {
    const figure = await getFigure(actor, params.imageId, {
      withMarks: new URL(request.url).searchParams.get("marks") !== "none",
    });
    const etag = `"${sha256Hex(figure.bytes.toString("base64"))}"`;
    const headers = { etag, "cache-control": "private, no-cache" };
    if (request.headers.get("if-none-match") === etag) {
      return new Response(null, { status: 304, headers });
    }
    return new Response(new Uint8Array(figure.bytes), {
      headers: {
        ...headers,
        "content-type": figure.mediaType,
        "content-length": String(figure.bytes.byteLength),
        "content-disposition": "inline",
      },
    });
  },
);
