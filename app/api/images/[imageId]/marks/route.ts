import { route } from "@/lib/http/route";
import { getBenchState } from "@/lib/images/marks-queries";

/** Marks and scale of a picture as they are now; the bench asks every two seconds. */
export const GET = route<{ imageId: string }>(
  { permission: "case.viewWork" },
  async ({ actor, params }) =>
    Response.json(await getBenchState(actor, params.imageId), {
      headers: { "cache-control": "no-store" },
    }),
);
