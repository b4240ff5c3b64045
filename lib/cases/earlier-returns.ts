import "server-only";
import { and, desc, eq, isNotNull, lt, ne } from "drizzle-orm";
import { database } from "@/db/client";
import { cases } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import type { CaseState } from "./constants";
import { visibleCases } from "./visible";

export type EarlierReturn = {
  caseId: string;
  number: string;
  title: string;
  state: CaseState;
  submittedAt: string | null;
};

const AT_MOST = 20;

type ThisCase = Pick<typeof cases.$inferSelect, "id" | "drawingNumber" | "submittedAt">;

/**
 * Field returns on the same drawing sent before this one, newest first, among the cases this person
 * may see. Every sent one is earlier than a draft.
 */
export async function earlierReturns(actor: Actor, row: ThisCase): Promise<EarlierReturn[]> {
  requireAllowed(actor, "case.list");
  const drawing = row.drawingNumber.trim();
  if (drawing === "") return [];
  const rows = await database()
    .select({
      caseId: cases.id,
      number: cases.number,
      title: cases.title,
      state: cases.state,
      submittedAt: cases.submittedAt,
    })
    .from(cases)
    .where(
      and(
        visibleCases(actor),
        isNotNull(cases.number),
        eq(cases.drawingNumber, drawing),
        ne(cases.id, row.id),
        row.submittedAt ? lt(cases.submittedAt, row.submittedAt) : undefined,
      ),
    )
    .orderBy(desc(cases.submittedAt), desc(cases.id))
    .limit(AT_MOST);
  return rows.flatMap(({ number, submittedAt, ...rest }) =>
    number === null ? [] : [{ ...rest, number, submittedAt: submittedAt?.toISOString() ?? null }],
  );
}
