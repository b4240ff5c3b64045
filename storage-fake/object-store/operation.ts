import { StoreError } from "./errors";
import type { StoreRequest } from "./request";
import type { VerifiedSignature } from "./signature";
import type { Bucket, Store } from "./store";
import { type XmlNode, renderXml } from "./xml";

/** What an operation works with; the signature has been verified. */
export interface Context {
  store: Store;
  request: StoreRequest;
  signed: VerifiedSignature;
}

export type Handler = (context: Context) => Promise<void>;

/** @throws StoreError 404 when the bucket does not exist. */
export function bucketOf({ store, request }: Context): Bucket {
  return store.bucket(request.bucket ?? "");
}

export function keyOf({ request }: Context): string {
  return request.key ?? "";
}

export function sendXml({ request }: Context, rootName: string, children: XmlNode[]): void {
  const body = Buffer.from(renderXml(rootName, children));
  request.response.writeHead(200, {
    "Content-Type": "application/xml",
    "Content-Length": body.length,
  });
  request.response.end(body);
}

export function sendEmpty({ request }: Context, status: 200 | 204): void {
  if (status === 200) request.response.setHeader("Content-Length", 0);
  request.response.writeHead(status).end();
}

/** @throws StoreError 400 when it is no whole number of `least` or more. */
export function wholeNumber(
  { request }: Context,
  name: string,
  { fallback, least, most }: { fallback: number; least: number; most: number },
): number {
  const text = request.queryValue(name);
  if (text === undefined) return fallback;
  if (!/^\d{1,9}$/.test(text) || Number(text) < least) {
    throw new StoreError(400, "InvalidArgument", `${name} must be a whole number from ${least}.`);
  }
  return Math.min(Number(text), most);
}
