import { AppError } from "@/lib/errors";
import { currentDeadlines } from "@/lib/auth/session";
import { route } from "@/lib/http/route";

/** When this sign-in ends. Asking counts as use, unless the background header says otherwise. */
export const GET = route({ permission: "self.view" }, async () => {
  const deadlines = await currentDeadlines();
  if (!deadlines) throw new AppError("NOT_SIGNED_IN");
  return Response.json(
    { idleEndsAt: deadlines.idleEndsAt.toISOString(), endsAt: deadlines.endsAt.toISOString() },
    { headers: { "cache-control": "no-store" } },
  );
});
