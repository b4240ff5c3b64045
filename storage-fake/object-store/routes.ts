import {
  createBucket,
  deleteBucket,
  deleteCors,
  getCors,
  headBucket,
  listBuckets,
  putCors,
} from "./buckets";
import { completeUpload } from "./complete-upload";
import { removeObject, removeObjects } from "./delete-objects";
import { notImplemented } from "./errors";
import { headObject, readObject } from "./get-object";
import { listObjects } from "./list-objects";
import type { Handler } from "./operation";
import { putObject } from "./put-object";
import type { StoreRequest } from "./request";
import { abortUpload, beginUpload, showParts, showUploads, uploadPart } from "./uploads";

interface Route {
  on: "service" | "bucket" | "object";
  method: string;
  /** Query parameters that make a request this operation. */
  needs: string[];
  /** Further query parameters that it understands. */
  knows: string[];
  handler: Handler;
}

const OVERRIDES = [
  "response-cache-control",
  "response-content-disposition",
  "response-content-encoding",
  "response-content-language",
  "response-content-type",
  "response-expires",
];

const LISTING = [
  ["prefix", "delimiter", "max-keys", "continuation-token", "start-after"],
  ["encoding-type", "fetch-owner"],
].flat();

function route(
  on: Route["on"],
  method: string,
  needs: string[],
  handler: Handler,
  knows: string[] = [],
): Route {
  return { on, method, needs, handler, knows };
}

const ROUTES: Route[] = [
  route("service", "GET", [], listBuckets),
  route("bucket", "PUT", [], createBucket),
  route("bucket", "HEAD", [], headBucket),
  route("bucket", "DELETE", [], deleteBucket),
  route("bucket", "GET", ["list-type"], listObjects, LISTING),
  route("bucket", "POST", ["delete"], removeObjects),
  route("bucket", "PUT", ["cors"], putCors),
  route("bucket", "GET", ["cors"], getCors),
  route("bucket", "DELETE", ["cors"], deleteCors),
  route("bucket", "GET", ["uploads"], showUploads, [
    "prefix",
    "key-marker",
    "upload-id-marker",
    "max-uploads",
  ]),
  route("object", "GET", [], readObject, OVERRIDES),
  route("object", "HEAD", [], headObject, OVERRIDES),
  route("object", "PUT", [], putObject),
  route("object", "DELETE", [], removeObject),
  route("object", "POST", ["uploads"], beginUpload),
  route("object", "PUT", ["partNumber", "uploadId"], uploadPart),
  route("object", "POST", ["uploadId"], completeUpload),
  route("object", "DELETE", ["uploadId"], abortUpload),
  route("object", "GET", ["uploadId"], showParts, ["max-parts", "part-number-marker"]),
];

const SIGNATURE_PARAMETERS = [
  "X-Amz-Algorithm",
  "X-Amz-Credential",
  "X-Amz-Date",
  "X-Amz-Expires",
  "X-Amz-SignedHeaders",
  "X-Amz-Signature",
  "X-Amz-Content-Sha256",
];

const KNOWN_SETTINGS = new RegExp(
  `^x-amz-(${[
    "date|content-sha256|decoded-content-length|trailer|user-agent|security-token",
    "algorithm|credential|expires|signedheaders|signature",
    "checksum-(crc32|sha1|sha256|mode|algorithm|type)|sdk-checksum-algorithm",
    "copy-source|copy-source-if-(none-)?match|copy-source-if-(un)?modified-since",
    "metadata-directive|meta-.+",
  ].join("|")})$`,
);

/**
 * The operation that a request asks for.
 *
 * @throws StoreError 501 for an operation, sub-resource or `x-amz-` setting that is not made here:
 *   taking it for the plain operation could overwrite an object or drop a protection.
 */
export function findHandler(request: StoreRequest): Handler {
  const on = request.bucket === null ? "service" : request.key === null ? "bucket" : "object";
  const names = request.query
    .map(([name]) => name)
    .filter((name) => !SIGNATURE_PARAMETERS.includes(name) && name !== "x-id")
    .filter((name) => !(request.presigned && name.toLowerCase().startsWith("x-amz-")));
  const found = ROUTES.find(
    (candidate) =>
      candidate.on === on &&
      candidate.method === request.method &&
      candidate.needs.every((name) => names.includes(name)) &&
      names.every((name) => candidate.needs.includes(name) || candidate.knows.includes(name)),
  );
  if (!found) {
    const asked = names.length > 0 ? ` with ${names.join(", ")}` : "";
    throw notImplemented(`${request.method} of the ${on}${asked}`);
  }
  const setting = request.amzNames().find((name) => !KNOWN_SETTINGS.test(name));
  if (setting !== undefined) throw notImplemented(`the setting ${setting}`);
  return found.handler;
}
