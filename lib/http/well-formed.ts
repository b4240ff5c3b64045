/** With the u flag only halves that stand alone are code points of their own. */
const LONE_HALF = /\p{Surrogate}/gu;

/**
 * The same value with each half of a surrogate pair that stands alone in its texts put as U+FFFD.
 * No letter is lost: MariaDB writes it so in text, and refuses JSON that holds one.
 */
export function wellFormed<T>(value: T): T {
  return mended(value) as T;
}

function mended(value: unknown): unknown {
  if (typeof value === "string") return value.replace(LONE_HALF, "\ufffd");
  if (Array.isArray(value)) return value.map(mended);
  if (isPlainObject(value)) {
    return Object.fromEntries(Object.entries(value).map(([key, part]) => [key, mended(part)]));
  }
  return value;
}

function isPlainObject(value: unknown): value is Record<string, unknown> {
  if (typeof value !== "object" || value === null) return false;
  const prototype: unknown = Object.getPrototypeOf(value);
  return prototype === Object.prototype || prototype === null;
}
