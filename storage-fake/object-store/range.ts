import { StoreError } from "./errors";

export interface ByteRange {
  first: number;
  /** Inclusive. */
  last: number;
}

/**
 * One byte range of RFC 9110 section 14: `bytes=10-19`, `bytes=10-` or `bytes=-10`.
 * Null when there is none, or several, or another unit: the whole object is the answer then.
 *
 * @throws StoreError 416 when the range lies outside the object.
 */
export function parseRange(header: string | undefined, size: number): ByteRange | null {
  const found = /^bytes=(\d*)-(\d*)$/.exec(header?.trim() ?? "");
  if (!found) return null;
  const [, from = "", to = ""] = found;
  if (from === "" && to === "") return null;
  const first = from === "" ? Math.max(0, size - Number(to)) : Number(from);
  const last = from === "" || to === "" ? size - 1 : Math.min(Number(to), size - 1);
  if (from !== "" && to !== "" && Number(from) > Number(to)) return null;
  if (first > last) {
    throw new StoreError(416, "InvalidRange", "The range lies outside the object.");
  }
  return { first, last };
}
