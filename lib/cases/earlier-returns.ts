import "server-only";
import { and, desc, eq, inArray, isNotNull, ne } from "drizzle-orm";
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

const columns = {
  caseId: cases.id,
  number: cases.number,
  title: cases.title,
  state: cases.state,
  submittedAt: cases.submittedAt,
};

type Found = { [K in keyof typeof columns]: (typeof columns)[K]["_"]["data"] | null };

const plain = (row: Found): EarlierReturn[] =>
  row.caseId && row.number && row.state
    ? [
        {
          caseId: row.caseId,
          number: row.number,
          title: row.title ?? "",
          state: row.state,
          submittedAt: row.submittedAt?.toISOString() ?? null,
        },
      ]
    : [];

/** Earlier field returns on the same drawing, newest first, among the cases this person may see. */
export async function earlierReturns(
  actor: Actor,
  drawingNumber: string,
  exceptCaseId: string | null,
): Promise<EarlierReturn[]> {
  requireAllowed(actor, "case.list");
  const wanted = drawingNumber.trim();
  if (wanted === "") return [];
  const rows = await database()
    .select(columns)
    .from(cases)
    .where(
      and(
        visibleCases(actor),
        isNotNull(cases.number),
        eq(cases.drawingNumber, wanted),
        exceptCaseId ? ne(cases.id, exceptCaseId) : undefined,
      ),
    )
    .orderBy(desc(cases.submittedAt), desc(cases.id))
    .limit(AT_MOST);
  return rows.flatMap(plain);
}

/** Of the named cases, those this person may open; a number alone gives nothing away. */
export async function visibleByNumber(
  actor: Actor,
  numbers: readonly string[],
): Promise<EarlierReturn[]> {
  requireAllowed(actor, "case.list");
  if (numbers.length === 0) return [];
  const rows = await database()
    .select(columns)
    .from(cases)
    .where(and(visibleCases(actor), inArray(cases.number, [...numbers])));
  return rows.flatMap(plain);
}
