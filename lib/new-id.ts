import "server-only";
import { randomBytes } from "node:crypto";

const ALPHABET = "0123456789abcdefghjkmnpqrstvwxyz";

/** `case_` and 24 characters: time first, so that neighbours in time are neighbours on disk. */
export function newId(prefix: string): string {
  const time = Date.now().toString(36).padStart(9, "0");
  const random = Array.from(randomBytes(15), (byte) => ALPHABET[byte & 31]).join("");
  return `${prefix}_${time}${random}`;
}
