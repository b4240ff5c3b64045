import "server-only";
import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { caseMoves, cases, fieldReturns, organisations } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import { AppError, notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { newId } from "@/lib/new-id";
import { partColumns } from "./part-columns";
import { CreateDraftInput } from "./schemas";

export type CreatedDraft = { caseId: string; revision: number };

/**
 * Starts a field return. People of a client start it for their own organisation; people of the
 * laboratory name the client. It has no number until it is sent.
 */
export async function createDraft(actor: Actor, raw: unknown): Promise<CreatedDraft> {
  requireAllowed(actor, "case.create");
  const input = parseInput(CreateDraftInput, raw);
  const answers = input.answers ?? {};
  const caseId = newId("case");
  await transaction(async (tx) => {
    const organisation = await clientOf(tx, actor, input.organisationId);
    const columns = partColumns(answers);
    await tx
      .insert(cases)
      .values({ id: caseId, organisationId: organisation.id, requesterId: actor.id, ...columns });
    await tx.insert(fieldReturns).values({ caseId, answers, revision: 1, savedById: actor.id });
    await tx.insert(caseMoves).values({
      id: newId("move"),
      caseId,
      fromState: null,
      toState: "draft",
      byId: actor.id,
    });
    await recordEvent(tx, {
      caseId,
      actor,
      action: "case.create",
      subject: { kind: "case", id: caseId, label: "Draft" },
      before: null,
      after: { state: "draft", organisation: organisation.name, answers },
    });
  });
  return { caseId, revision: 1 };
}

async function clientOf(tx: Transaction, actor: Actor, named: string | undefined) {
  if (actor.organisationKind === "client") {
    if (named !== undefined && named !== actor.organisationId) throw notFound();
    return { id: actor.organisationId, name: actor.organisationName };
  }
  if (named === undefined || named === "") {
    throw new AppError("INVALID", undefined, {
      fields: { organisationId: "Choose the client that the part comes from." },
    });
  }
  const [client] = await tx
    .select({ id: organisations.id, name: organisations.name })
    .from(organisations)
    .where(and(eq(organisations.id, named), eq(organisations.kind, "client")));
  if (!client) throw notFound();
  return client;
}
