import "server-only";
import { rawJson, route } from "@/lib/http/route";
import { answerConversion } from "@/lib/reference/answer-conversion";
import { CONVERT_MAX_BYTES } from "@/lib/reference/constants";
import { conversionChunks } from "@/lib/reference/conversion-chunks";

/** Converts up to 10 000 hardness values by the published tables; values are not rounded. */
export const POST = route({ permission: "hardness.convert" }, async ({ actor, request }) => {
  const results = await answerConversion(actor, await rawJson(request, CONVERT_MAX_BYTES));
  return new Response(conversionChunks(results), {
    headers: { "content-type": "application/json", "cache-control": "no-store" },
  });
});
