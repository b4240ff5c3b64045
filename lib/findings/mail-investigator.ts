import "server-only";
import { eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { people } from "@/db/schema";
import type { CaseRow } from "@/lib/cases/subject";
import { queueMail } from "@/lib/outbox/mail";
import { routes } from "@/lib/routes";

/** Tells the investigator what happened to the findings. */
export async function mailInvestigator(
  tx: Transaction,
  row: CaseRow,
  news: string,
  note: string,
): Promise<void> {
  if (row.investigatorId === null) return;
  const [person] = await tx
    .select({ email: people.email })
    .from(people)
    .where(eq(people.id, row.investigatorId));
  if (!person) return;
  await queueMail(tx, {
    to: person.email,
    subject: `${row.number}: findings, ${row.title}`,
    news,
    facts: [
      ["Case", `${row.number} ${row.title}`],
      ...(note ? [["Note", note] satisfies [string, string]] : []),
    ],
    button: { label: "Open the findings", path: routes.findings(row.id) },
  });
}
