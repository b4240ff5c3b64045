import { noSuchKey, notImplemented, preconditionFailed } from "./errors";
import type { StoredObject } from "./objects";
import type { StoreRequest } from "./request";

function matchesEtag(list: string, etag: string): boolean {
  return list
    .split(",")
    .map((item) => item.trim().replace(/^W\//, "").replace(/^"|"$/g, ""))
    .some((item) => item === "*" || item === etag);
}

/** HTTP dates have whole seconds, so the object's time is cut to them before comparing. */
function modifiedAfter(object: StoredObject, date: string): boolean | null {
  const then = Date.parse(date);
  if (Number.isNaN(then)) return null;
  return Math.floor(Date.parse(object.lastModified) / 1000) * 1000 > then;
}

/**
 * Conditions of a read, in the order of RFC 9110 section 13.2.2.
 *
 * @param prefix Empty for GET and HEAD, `x-amz-copy-source-` for the source of a copy.
 */
export function readCondition(
  request: StoreRequest,
  object: StoredObject,
  prefix = "",
): "ok" | "not-modified" | "failed" {
  const value = (name: string) => request.header(`${prefix}${name}`);
  const ifMatch = value("if-match");
  const ifUnmodifiedSince = value("if-unmodified-since");
  if (ifMatch !== undefined) {
    if (!matchesEtag(ifMatch, object.etag)) return "failed";
  } else if (ifUnmodifiedSince !== undefined && modifiedAfter(object, ifUnmodifiedSince)) {
    return "failed";
  }
  const ifNoneMatch = value("if-none-match");
  const ifModifiedSince = value("if-modified-since");
  if (ifNoneMatch !== undefined)
    return matchesEtag(ifNoneMatch, object.etag) ? "not-modified" : "ok";
  if (ifModifiedSince !== undefined && modifiedAfter(object, ifModifiedSince) === false) {
    return "not-modified";
  }
  return "ok";
}

/**
 * Conditions of a write: `If-None-Match: *` and `If-Match: ETAG`.
 *
 * @throws StoreError 412 when one does not hold, 404 for If-Match on nothing, 501 for other forms.
 */
export function writeCondition(
  request: StoreRequest,
  key: string,
): (current: StoredObject | undefined) => void {
  const ifMatch = request.header("if-match");
  const ifNoneMatch = request.header("if-none-match");
  if (ifNoneMatch !== undefined && ifNoneMatch.trim() !== "*") {
    throw notImplemented("If-None-Match on a write with anything but *");
  }
  return (current) => {
    if (ifNoneMatch !== undefined && current) throw preconditionFailed();
    if (ifMatch === undefined) return;
    if (!current) throw noSuchKey(key);
    if (!matchesEtag(ifMatch, current.etag)) throw preconditionFailed();
  };
}
