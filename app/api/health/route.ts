import { health } from "@/lib/health";
import { openRoute } from "@/lib/http/route";

export const dynamic = "force-dynamic";

export const GET = openRoute(async () => {
  const parts = await health();
  const isUp = Object.values(parts).every((part) => part === "up");
  return Response.json(
    { status: isUp ? "up" : "down", ...parts },
    { status: isUp ? 200 : 503, headers: { "cache-control": "no-store" } },
  );
});
