import { route } from "@/lib/http/route";
import { listPictures } from "@/lib/images/list-pictures";

/** Pictures of a case with where each stands. */
export const GET = route<{ caseId: string }>(
  { permission: "case.viewWork" },
  async ({ actor, params }) =>
    Response.json(await listPictures(actor, params.caseId), {
      headers: { "cache-control": "no-store" },
    }),
);
