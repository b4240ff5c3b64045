import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { caseHolds, cases } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { newId } from "@/lib/new-id";
import { mailAboutCase, recipients } from "./case-mail";
import { HOLD_NAMES } from "./constants";
import { HoldCaseInput } from "./schemas";
import { writeCase } from "./write-case";

/** Sets a flag over the case, with who and why. A restricted case is open to those named on it. */
export async function holdCase(actor: Actor, raw: unknown): Promise<{ holdId: string }> {
  const { caseId, kind, reason } = parseInput(HoldCaseInput, raw);
  return writeCase(actor, "case.hold", caseId, async (tx, { row }) => {
    const [open] = await tx
      .select({ id: caseHolds.id })
      .from(caseHolds)
      .where(
        and(eq(caseHolds.caseId, caseId), eq(caseHolds.kind, kind), isNull(caseHolds.clearedAt)),
      );
    if (open) {
      throw new AppError("CONFLICT", `The case has this hold already: ${HOLD_NAMES[kind]}.`);
    }
    const holdId = newId("hold");
    await tx.insert(caseHolds).values({ id: holdId, caseId, kind, reason, setById: actor.id });
    const isRestricted = row.isRestricted || kind === "restricted";
    await tx.update(cases).set({ isOnHold: true, isRestricted }).where(eq(cases.id, caseId));
    await recordEvent(tx, {
      caseId,
      actor,
      action: "case.hold",
      subject: { kind: "hold", id: holdId, label: HOLD_NAMES[kind] },
      before: { isOnHold: row.isOnHold, isRestricted: row.isRestricted },
      after: { isOnHold: true, isRestricted, kind, reason },
    });
    const told = (await recipients(tx, [row.leadId, row.investigatorId])).filter(
      ({ id }) => id !== actor.id,
    );
    await mailAboutCase(tx, told, row, "on hold", {
      news: `${actor.name} put the case on hold: ${HOLD_NAMES[kind]}.`,
      facts: [["Reason", reason]],
    });
    return { holdId };
  });
}
