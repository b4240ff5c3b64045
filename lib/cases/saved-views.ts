import "server-only";
import { and, asc, count, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { people, savedViews } from "@/db/schema";
import { databaseErrorNumber, DUPLICATE_KEY, transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import { AppError, notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { newId } from "@/lib/new-id";
import { DropViewInput, SaveViewInput, VIEWS_MAX } from "./view-schemas";

export type SavedView = { id: string; name: string; query: string };

export async function listViews(actor: Actor): Promise<SavedView[]> {
  requireAllowed(actor, "view.save");
  return database()
    .select({ id: savedViews.id, name: savedViews.name, query: savedViews.query })
    .from(savedViews)
    .where(eq(savedViews.personId, actor.id))
    .orderBy(asc(savedViews.position), asc(savedViews.madeAt));
}

/** Keeps a view under a name, or changes the one of that id. @throws AppError INVALID on a taken name */
export async function saveView(actor: Actor, raw: unknown): Promise<SavedView> {
  requireAllowed(actor, "view.save");
  const input = parseInput(SaveViewInput, raw);
  try {
    return await transaction(async (tx) => {
      const [existing] = input.id
        ? await tx
            .select()
            .from(savedViews)
            .where(and(eq(savedViews.id, input.id), eq(savedViews.personId, actor.id)))
        : [];
      if (input.id && !existing) throw notFound();
      const id = existing?.id ?? newId("view");
      if (existing) {
        await tx
          .update(savedViews)
          .set({ name: input.name, query: input.query })
          .where(eq(savedViews.id, id));
      } else {
        // Two at once wait for one another here, so that neither counts without the other.
        await tx
          .select({ id: people.id })
          .from(people)
          .where(eq(people.id, actor.id))
          .for("update");
        const [kept] = await tx
          .select({ n: count() })
          .from(savedViews)
          .where(eq(savedViews.personId, actor.id));
        if ((kept?.n ?? 0) >= VIEWS_MAX) {
          throw new AppError("INVALID", `You keep ${VIEWS_MAX} views already. Drop one first.`);
        }
        await tx.insert(savedViews).values({
          id,
          personId: actor.id,
          name: input.name,
          query: input.query,
          position: kept?.n ?? 0,
        });
      }
      await recordEvent(tx, {
        caseId: null,
        actor,
        action: "view.save",
        subject: { kind: "view", id, label: input.name },
        before: existing ? { name: existing.name, query: existing.query } : null,
        after: { name: input.name, query: input.query },
      });
      return { id, name: input.name, query: input.query };
    });
  } catch (error) {
    if (databaseErrorNumber(error) === DUPLICATE_KEY) {
      throw new AppError("INVALID", undefined, {
        fields: { name: "You have a view of this name already." },
      });
    }
    throw error;
  }
}

export async function dropView(actor: Actor, raw: unknown): Promise<void> {
  requireAllowed(actor, "view.save");
  const { id } = parseInput(DropViewInput, raw);
  await transaction(async (tx) => {
    const mine = and(eq(savedViews.id, id), eq(savedViews.personId, actor.id));
    const [view] = await tx.select().from(savedViews).where(mine);
    if (!view) throw notFound();
    await tx.delete(savedViews).where(mine);
    await recordEvent(tx, {
      caseId: null,
      actor,
      action: "view.save",
      subject: { kind: "view", id, label: view.name },
      before: { name: view.name, query: view.query },
      after: null,
    });
  });
}
