import "server-only";
import { randomBytes } from "node:crypto";
import { and, eq, gt, isNull } from "drizzle-orm";
import { database, type Transaction } from "@/db/client";
import { people, personTokens } from "@/db/schema";
import { sha256Hex } from "@/lib/canonical-json";
import { INVITATION_VALID_HOURS, PASSWORD_RESET_VALID_HOURS, type TokenKind } from "./constants";

const VALID_HOURS: Record<TokenKind, number> = {
  invitation: INVITATION_VALID_HOURS,
  "password-reset": PASSWORD_RESET_VALID_HOURS,
};

/** Makes a one-time token; earlier ones of the same kind stop working. Only its digest is kept. */
export async function makeToken(
  tx: Transaction,
  personId: string,
  kind: TokenKind,
): Promise<string> {
  const token = randomBytes(32).toString("base64url");
  await tx
    .update(personTokens)
    .set({ usedAt: new Date() })
    .where(
      and(
        eq(personTokens.personId, personId),
        eq(personTokens.kind, kind),
        isNull(personTokens.usedAt),
      ),
    );
  await tx.insert(personTokens).values({
    digest: sha256Hex(token),
    personId,
    kind,
    expiresAt: new Date(Date.now() + VALID_HOURS[kind] * 3_600_000),
  });
  return token;
}

/** Whose token this is, while it can be used; null otherwise. */
export async function findToken(
  token: string,
): Promise<{ personId: string; name: string; email: string; kind: TokenKind } | null> {
  const [row] = await database()
    .select({
      personId: people.id,
      name: people.name,
      email: people.email,
      kind: personTokens.kind,
    })
    .from(personTokens)
    .innerJoin(people, eq(people.id, personTokens.personId))
    .where(
      and(
        eq(personTokens.digest, sha256Hex(token)),
        isNull(personTokens.usedAt),
        gt(personTokens.expiresAt, new Date()),
        eq(people.isActive, true),
      ),
    );
  return row ?? null;
}
