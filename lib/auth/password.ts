import "server-only";
import { hash, verify } from "@node-rs/argon2";

/** Argon2id, 19 MiB, 2 passes, 1 lane: OWASP's first choice (Password Storage Cheat Sheet, from memory). */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

export async function hashPassword(password: string): Promise<string> {
  return hash(password, COST);
}

/** A hash of nothing anyone knows, so that an unknown account takes as long as a known one. */
let decoy: Promise<string> | undefined;

export async function verifyPassword(
  passwordHash: string | null,
  password: string,
): Promise<boolean> {
  if (passwordHash === null) {
    decoy ??= hashPassword(crypto.randomUUID());
    await verify(await decoy, password);
    return false;
  }
  return verify(passwordHash, password);
}
