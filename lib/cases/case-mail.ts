import "server-only";
import { and, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { organisations, people } from "@/db/schema";
import { POLICY } from "@/lib/auth/policy";
import { type Mail, queueMail } from "@/lib/outbox/mail";
import type { Role } from "@/lib/people/constants";
import { routes } from "@/lib/routes";
import type { CaseRow } from "./subject";

export type Recipient = { id: string; email: string };

/** Active people by id; those who left get no mail. */
export async function recipients(
  tx: Transaction,
  ids: readonly (string | null)[],
): Promise<Recipient[]> {
  const wanted = [...new Set(ids.filter((id) => id !== null))];
  if (wanted.length === 0) return [];
  return tx
    .select({ id: people.id, email: people.email })
    .from(people)
    .where(and(inArray(people.id, wanted), eq(people.isActive, true)));
}

/** Everyone at the laboratory who can accept a case. */
export async function triagePeople(tx: Transaction): Promise<Recipient[]> {
  const roles = Object.keys(POLICY["case.accept"].roles) as Role[];
  return tx
    .select({ id: people.id, email: people.email })
    .from(people)
    .innerJoin(organisations, eq(organisations.id, people.organisationId))
    .where(
      and(
        inArray(people.role, roles),
        eq(people.isActive, true),
        eq(organisations.kind, "laboratory"),
      ),
    );
}

type CaseMail = {
  news: string;
  facts?: readonly [string, string][];
  button?: Mail["button"];
  after?: string;
};

/** One message to each recipient, with the number and the part; the subject begins with the number. */
export async function mailAboutCase(
  tx: Transaction,
  to: readonly Recipient[],
  row: Pick<CaseRow, "id" | "number" | "title" | "partName" | "drawingNumber" | "serialNumber">,
  what: string,
  mail: CaseMail,
): Promise<void> {
  const facts: [string, string][] = [
    ["Case", row.number ?? "not numbered yet"],
    ["Title", row.title],
    ["Part", row.partName],
    ["Drawing", row.drawingNumber],
    ["Serial or lot", row.serialNumber],
  ];
  for (const { email } of to) {
    await queueMail(tx, {
      to: email,
      subject: [row.number, what, row.partName].filter(Boolean).join(", "),
      news: mail.news,
      facts: [...facts.filter(([, value]) => value !== ""), ...(mail.facts ?? [])],
      button: mail.button ?? { label: "Open the case", path: routes.case(row.id) },
      ...(mail.after && { after: mail.after }),
    });
  }
}
