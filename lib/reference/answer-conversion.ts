import "server-only";
import { database } from "@/db/client";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import { AppError } from "@/lib/errors";
import { answerConvertRequest, type ConvertedValue } from "@/lib/hardness/convert-request";
import { parseInput } from "@/lib/http/parse-input";
import { z } from "zod";
import { CONVERT_VALUES_MAX } from "./constants";
import { enabledTableIds } from "./enabled-tables";
import { ConvertRequestBody } from "./schemas";

const counted = z.looseObject({ values: z.array(z.unknown()) });

/**
 * Answers a conversion request with the tables switched on at this laboratory.
 * @throws AppError TOO_LARGE above the number of values; INVALID for a malformed request;
 * UNKNOWN_NAME for a material group, scale or table that stands nowhere
 */
export async function answerConversion(
  actor: Actor,
  raw: unknown,
): Promise<readonly ConvertedValue[]> {
  requireAllowed(actor, "hardness.convert");
  const { data } = counted.safeParse(raw);
  if (data && data.values.length > CONVERT_VALUES_MAX)
    throw new AppError(
      "TOO_LARGE",
      `The request holds ${data.values.length} values; ${CONVERT_VALUES_MAX} is the most. Nothing was converted. Send them in parts.`,
    );
  const request = parseInput(ConvertRequestBody, raw);
  const answer = answerConvertRequest(request, await enabledTableIds(database()));
  if (answer.ok) return answer.results;
  const names = answer.unknownNames.map(({ kind, name }) => `${kind} “${name}”`);
  throw new AppError(
    "UNKNOWN_NAME",
    `Not known here: ${names.join(", ")}. Nothing was converted. Correct the name and send again.`,
  );
}
