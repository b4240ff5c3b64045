import { randomUUID } from "node:crypto";
import { type IncomingMessage, type Server, type ServerResponse, createServer } from "node:http";
import { applyCors } from "./cors";
import { StoreError, errorBody } from "./errors";
import { readRequest } from "./request";
import { findHandler } from "./routes";
import { type Credentials, verifySignature } from "./signature";
import type { Store } from "./store";

export const HEALTH_PATH = "/_fake/health";

function isGone(error: unknown): boolean {
  const codes = ["ECONNRESET", "ERR_STREAM_PREMATURE_CLOSE", "EPIPE"];
  return error instanceof Error && "code" in error && codes.includes(String(error.code));
}

function asStoreError(error: unknown): StoreError {
  if (error instanceof StoreError) return error;
  console.error(error);
  if (error instanceof Error && "code" in error && error.code === "ENOSPC") {
    return new StoreError(
      507,
      "InsufficientStorage",
      "The disk of the store is full. Nothing was changed. Make room and send the request again.",
    );
  }
  return new StoreError(500, "InternalError", "The store failed. Its log says why.");
}

function sendError(incoming: IncomingMessage, response: ServerResponse, error: unknown): void {
  if (isGone(error) && incoming.destroyed) return;
  const refusal = asStoreError(error);
  if (response.headersSent) {
    response.destroy();
    return;
  }
  const requestId = String(response.getHeader("x-amz-request-id"));
  const resource = (incoming.url ?? "/").split("?")[0] ?? "/";
  const body = Buffer.from(errorBody(refusal, resource, requestId));
  for (const name of response.getHeaderNames()) {
    if (/^(etag|last-modified|content-|cache-control|expires|x-amz-meta-)/.test(name)) {
      response.removeHeader(name);
    }
  }
  response.writeHead(refusal.status, {
    "Content-Type": "application/xml",
    "Content-Length": body.length,
  });
  response.end(incoming.method === "HEAD" ? undefined : body);
}

async function handle(
  store: Store,
  credentials: Credentials,
  incoming: IncomingMessage,
  response: ServerResponse,
  waitsForContinue: boolean,
): Promise<void> {
  response.setHeader("x-amz-request-id", randomUUID());
  if (incoming.url === HEALTH_PATH) {
    response.writeHead(200, { "Content-Type": "application/json" }).end('{"status":"ok"}');
    return;
  }
  const request = readRequest(incoming, response, waitsForContinue);
  const bucket = store.findBucket(request.bucket ?? "");
  const allowed = applyCors(incoming, response, bucket?.cors ?? []);
  if (request.method === "OPTIONS") {
    if (!allowed) {
      throw new StoreError(403, "AccessForbidden", "No CORS rule of the bucket allows this.");
    }
    response.writeHead(200, { "Content-Length": 0 }).end();
    return;
  }
  const signed = verifySignature(request, credentials, Date.now());
  await findHandler(request)({ store, request, signed });
}

/** The HTTP server over an opened store; the caller listens and closes. */
export function createObjectStoreServer(store: Store, credentials: Credentials): Server {
  // A large part over a slow line may take longer than the default five minutes.
  const server = createServer({ requestTimeout: 0, keepAliveTimeout: 65_000 });
  const listener =
    (waitsForContinue: boolean) => (incoming: IncomingMessage, response: ServerResponse) => {
      handle(store, credentials, incoming, response, waitsForContinue).catch((error: unknown) =>
        sendError(incoming, response, error),
      );
    };
  server.on("request", listener(false));
  server.on("checkContinue", listener(true));
  return server;
}
