import "server-only";
import { unstable_rethrow } from "next/navigation";
import type { z } from "zod";
import type { Actor } from "@/lib/auth/actor";
import { type Action, OPEN_TO_ALL } from "@/lib/auth/policy";
import { currentActor } from "@/lib/auth/session";
import { AppError, ERROR_STATUS } from "@/lib/errors";
import { requireRole } from "./action";
import { explain } from "./explain";
import { parseInput } from "./parse-input";

type Params = Record<string, string | string[]>;
type Context<P> = { params: Promise<P> };
export type RouteCall<P> = { actor: Actor; request: Request; params: P };

function failure(error: unknown): Response {
  unstable_rethrow(error);
  const said = explain(error);
  return Response.json(
    { error: said },
    { status: ERROR_STATUS[said.code], headers: { "cache-control": "no-store" } },
  );
}

/** A cross-site page may not write on behalf of a signed-in person. */
function refuseForeignOrigin(request: Request): void {
  if (request.method === "GET" || request.method === "HEAD") return;
  const site = request.headers.get("sec-fetch-site");
  if (site !== null && site !== "same-origin" && site !== "none") {
    throw new AppError("NOT_ALLOWED", "This request came from another site. Nothing was changed.");
  }
}

/** Builds a route handler: signed in, role, then `run`. Errors come back as JSON with a status. */
export function route<P extends Params = Params>(
  def: { permission: Action },
  run: (call: RouteCall<P>) => Promise<Response>,
): ((request: Request, context: Context<P>) => Promise<Response>) & { permission: Action } {
  const handle = async (request: Request, context: Context<P>): Promise<Response> => {
    try {
      refuseForeignOrigin(request);
      const actor = await currentActor();
      if (!actor) throw new AppError("NOT_SIGNED_IN");
      requireRole(actor, def.permission);
      return await run({ actor, request, params: await context.params });
    } catch (error) {
      return failure(error);
    }
  };
  return Object.assign(handle, { permission: def.permission });
}

/** A route that needs no sign-in. */
export function openRoute(
  run: (request: Request) => Promise<Response>,
): ((request: Request) => Promise<Response>) & { permission: typeof OPEN_TO_ALL } {
  const handle = async (request: Request): Promise<Response> => {
    try {
      return await run(request);
    } catch (error) {
      return failure(error);
    }
  };
  return Object.assign(handle, { permission: OPEN_TO_ALL });
}

/** JSON body of a request, checked; refused above `maxBytes` before it is read whole. */
export async function jsonBody<S extends z.ZodType>(
  request: Request,
  schema: S,
  maxBytes = 1024 * 1024,
): Promise<z.output<S>> {
  return parseInput(schema, await rawJson(request, maxBytes));
}

export async function rawJson(request: Request, maxBytes: number): Promise<unknown> {
  const tooLarge = () =>
    new AppError(
      "TOO_LARGE",
      `The request is larger than ${Math.floor(maxBytes / 1024)} kB. Nothing was taken. Send less at once.`,
    );
  if (Number(request.headers.get("content-length") ?? 0) > maxBytes) throw tooLarge();
  const chunks: Uint8Array[] = [];
  let size = 0;
  for await (const chunk of request.body ?? []) {
    size += chunk.byteLength;
    if (size > maxBytes) throw tooLarge();
    chunks.push(chunk);
  }
  try {
    return JSON.parse(Buffer.concat(chunks).toString("utf8"));
  } catch (cause) {
    throw new AppError("INVALID", "The request is not JSON. Nothing was taken.", { cause });
  }
}
