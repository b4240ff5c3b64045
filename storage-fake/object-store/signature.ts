import { timingSafeEqual } from "node:crypto";
import { canonicalRequestHash, hmac } from "./canonical-request";
import { StoreError } from "./errors";
import type { StoreRequest } from "./request";

const ALGORITHM = "AWS4-HMAC-SHA256";
const MAX_SKEW_MS = 15 * 60 * 1000;
const MAX_EXPIRES_S = 7 * 24 * 3600;

export interface Credentials {
  accessKeyId: string;
  secretAccessKey: string;
}

/** A verified signature; signed body chunks continue the chain from it. */
export interface VerifiedSignature {
  /** `x-amz-content-sha256`: a hex digest, or one of the words for unsigned and streamed bodies. */
  payloadHash: string;
  amzDate: string;
  scope: string;
  signingKey: Buffer;
  signature: string;
}

interface Claim {
  credential: string;
  signedHeaders: string[];
  signature: string;
  amzDate: string;
  payloadHash: string;
}

function denied(message: string): StoreError {
  return new StoreError(403, "AccessDenied", message);
}

function malformed(message: string): StoreError {
  return new StoreError(400, "AuthorizationHeaderMalformed", message);
}

function claimFromHeader(request: StoreRequest, header: string): Claim {
  const [algorithm, ...rest] = header.split(/\s+/);
  if (algorithm !== ALGORITHM) {
    throw new StoreError(400, "InvalidRequest", `Only ${ALGORITHM} signatures are accepted.`);
  }
  const fields = new Map(
    rest
      .join("")
      .split(",")
      .map((field) => [field.slice(0, field.indexOf("=")), field.slice(field.indexOf("=") + 1)]),
  );
  const credential = fields.get("Credential");
  const signedHeaders = fields.get("SignedHeaders");
  const signature = fields.get("Signature");
  const payloadHash = request.header("x-amz-content-sha256");
  if (!credential || !signedHeaders || !signature) {
    throw malformed("The authorization header needs Credential, SignedHeaders and Signature.");
  }
  if (!payloadHash) {
    throw new StoreError(400, "InvalidRequest", "The header x-amz-content-sha256 is missing.");
  }
  return {
    credential,
    signedHeaders: signedHeaders.split(";"),
    signature,
    amzDate: request.header("x-amz-date") ?? "",
    payloadHash,
  };
}

function claimFromQuery(request: StoreRequest): Claim & { expiresS: number } {
  const value = (name: string) => request.queryValue(name) ?? "";
  const expires = value("X-Amz-Expires");
  const wrong = (message: string) =>
    new StoreError(400, "AuthorizationQueryParametersError", message);
  if (value("X-Amz-Algorithm") !== ALGORITHM) throw wrong(`X-Amz-Algorithm must be ${ALGORITHM}.`);
  if (!/^\d{1,6}$/.test(expires) || Number(expires) < 1 || Number(expires) > MAX_EXPIRES_S) {
    throw wrong("X-Amz-Expires must be a number of seconds from 1 to 604800.");
  }
  return {
    credential: value("X-Amz-Credential"),
    signedHeaders: value("X-Amz-SignedHeaders").split(";"),
    signature: value("X-Amz-Signature"),
    amzDate: value("X-Amz-Date"),
    payloadHash: request.header("x-amz-content-sha256") ?? "UNSIGNED-PAYLOAD",
    expiresS: Number(expires),
  };
}

function parseAmzDate(text: string): number {
  const found = /^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/.exec(text);
  if (!found) throw denied("The request needs its time as YYYYMMDDTHHMMSSZ.");
  const [year, month, day, hour, minute, second] = found.slice(1).map(Number);
  return Date.UTC(year ?? 0, (month ?? 1) - 1, day, hour, minute, second);
}

function checkTime(signedAt: number, now: number, expiresS: number | null): void {
  if (expiresS === null) {
    if (Math.abs(now - signedAt) > MAX_SKEW_MS) {
      throw new StoreError(
        403,
        "RequestTimeTooSkewed",
        "The time of the request and the time of the store differ by more than 15 minutes.",
      );
    }
    return;
  }
  if (signedAt - now > MAX_SKEW_MS) throw denied("The request is not valid yet.");
  if (now > signedAt + expiresS * 1000) throw denied("Request has expired.");
}

/** Every `x-amz-` header and the host must be covered, or they could be changed on the way. */
function checkCoverage(request: StoreRequest, signedHeaders: string[]): void {
  const sorted = [...signedHeaders].sort();
  if (sorted.some((name, place) => name !== signedHeaders[place] || name !== name.toLowerCase())) {
    throw malformed("SignedHeaders must be in lower case and sorted.");
  }
  const missing = Object.keys(request.incoming.headers).filter(
    (name) => (name === "host" || name.startsWith("x-amz-")) && !signedHeaders.includes(name),
  );
  if (missing.length > 0) {
    throw denied(`Headers were sent that the signature does not cover: ${missing.join(", ")}.`);
  }
}

function sameText(a: string, b: string): boolean {
  const left = Buffer.from(a);
  const right = Buffer.from(b);
  return left.length === right.length && timingSafeEqual(left, right);
}

/**
 * Verifies a Signature Version 4 in the authorization header or in the query (presigned).
 *
 * @param now Milliseconds since 1970-01-01 UTC.
 * @throws StoreError 403 (anonymous, unknown key, wrong signature, expired, clock skew) or 400 (form).
 */
export function verifySignature(
  request: StoreRequest,
  credentials: Credentials,
  now: number,
): VerifiedSignature {
  const header = request.incoming.headers.authorization;
  if (header !== undefined && request.presigned) {
    throw new StoreError(400, "InvalidArgument", "A request may carry only one signature.");
  }
  if (header === undefined && !request.presigned) {
    throw denied("Access Denied: the request is not signed.");
  }
  const query = request.presigned ? claimFromQuery(request) : null;
  const claim = query ?? claimFromHeader(request, header ?? "");

  const [accessKeyId, day, region, service, end, ...more] = claim.credential.split("/");
  if (!day || !region || service !== "s3" || end !== "aws4_request" || more.length > 0) {
    throw malformed("The credential must be KEY/YYYYMMDD/REGION/s3/aws4_request.");
  }
  if (!sameText(accessKeyId ?? "", credentials.accessKeyId)) {
    throw new StoreError(403, "InvalidAccessKeyId", "The store does not know this access key.");
  }
  if (request.header("x-amz-security-token") !== undefined) {
    throw new StoreError(403, "InvalidToken", "The store does not hand out session tokens.");
  }
  const signedAt = parseAmzDate(claim.amzDate);
  if (!claim.amzDate.startsWith(day)) throw malformed("The credential is for another day.");
  checkTime(signedAt, now, query?.expiresS ?? null);
  checkCoverage(request, claim.signedHeaders);

  const scope = `${day}/${region}/${service}/${end}`;
  const signingKey = [day, region, service, end].reduce<Buffer>(
    (key, part) => hmac(key, part),
    Buffer.from(`AWS4${credentials.secretAccessKey}`),
  );
  const hash = canonicalRequestHash(request, claim.signedHeaders, claim.payloadHash);
  const toSign = `${ALGORITHM}\n${claim.amzDate}\n${scope}\n${hash}`;
  const expected = hmac(signingKey, toSign).toString("hex");
  if (!sameText(expected, claim.signature)) {
    throw new StoreError(
      403,
      "SignatureDoesNotMatch",
      "The signature does not fit the request. Check the secret key and what was signed.",
    );
  }
  return {
    payloadHash: claim.payloadHash,
    amzDate: claim.amzDate,
    scope,
    signingKey,
    signature: expected,
  };
}
