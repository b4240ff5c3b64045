import "server-only";
import { and, asc, eq, inArray, ne } from "drizzle-orm";
import { database } from "@/db/client";
import { custodyEntries, items, people, records, recordVersions } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { decide } from "@/lib/auth/policy";
import { getCase } from "@/lib/cases/get-case";
import { LAB_ROLES } from "@/lib/people/constants";
import type { CustodyAct, ItemKind } from "./constants";
import { custodyBreaks } from "./custody-chain";
import { type ItemContent, itemContent } from "./schemas";

export type CustodyRow = {
  id: string;
  position: number;
  act: CustodyAct;
  at: string;
  fromPlace: string;
  toPlace: string;
  by: string;
  holder: string | null;
  reason: string;
  conditionNote: string | null;
  sealBroken: string | null;
  sealFitted: string | null;
  correctsId: string | null;
  checkCode: string;
};
export type ItemRow = {
  id: string;
  label: string;
  kind: ItemKind;
  parentId: string | null;
  version: number;
  content: ItemContent;
  entries: CustodyRow[];
  /** What breaks its chain, in words; empty when whole. */
  breaks: string[];
};
export type Evidence = {
  items: ItemRow[];
  holders: { id: string; name: string }[];
  mayRegister: boolean;
  mayHandOver: boolean;
  /** Why nothing can be registered now; null when it can. */
  refusal: string | null;
};

/** Items of a case with their chains of custody, in the order of their labels. */
export async function listItems(actor: Actor, caseId: string): Promise<Evidence> {
  const { subject } = await getCase(actor, "case.viewWork", caseId);
  const by = people;
  const [rows, entries, staff] = await Promise.all([
    database()
      .select({
        id: records.id,
        label: records.label,
        version: records.latestVersion,
        kind: items.kind,
        parentId: items.parentId,
        content: recordVersions.content,
      })
      .from(items)
      .innerJoin(records, eq(records.id, items.recordId))
      .innerJoin(
        recordVersions,
        and(
          eq(recordVersions.recordId, records.id),
          eq(recordVersions.number, records.latestVersion),
        ),
      )
      .where(and(eq(items.caseId, caseId), ne(records.state, "void")))
      .orderBy(asc(records.madeAt), asc(records.id)),
    database()
      .select({ entry: custodyEntries, by: by.name })
      .from(custodyEntries)
      .innerJoin(by, eq(by.id, custodyEntries.byId))
      .where(eq(custodyEntries.caseId, caseId))
      .orderBy(asc(custodyEntries.position)),
    database()
      .select({ id: people.id, name: people.name })
      .from(people)
      .where(and(inArray(people.role, LAB_ROLES), eq(people.isActive, true)))
      .orderBy(asc(people.name)),
  ]);
  const names = new Map(staff.map((person) => [person.id, person.name]));
  const register = decide(actor, "evidence.register", subject);
  return {
    mayRegister: register.allowed,
    mayHandOver: decide(actor, "evidence.handOver", subject).allowed,
    refusal: register.allowed ? null : register.says,
    holders: staff,
    items: rows.map((row) => {
      const own = entries.filter(({ entry }) => entry.itemId === row.id);
      return {
        ...row,
        content: itemContent.parse(row.content),
        breaks: custodyBreaks(own.map(({ entry }) => entry)),
        entries: own.map(({ entry, by: name }) => ({
          id: entry.id,
          position: entry.position,
          act: entry.act,
          at: entry.at.toISOString(),
          fromPlace: entry.fromPlace,
          toPlace: entry.toPlace,
          by: name,
          holder: entry.holderId === null ? null : (names.get(entry.holderId) ?? null),
          reason: entry.reason,
          conditionNote: entry.conditionNote,
          sealBroken: entry.sealBroken,
          sealFitted: entry.sealFitted,
          correctsId: entry.correctsId,
          checkCode: entry.sha256.slice(0, 8).replace(/(.{4})(?=.)/, "$1 "),
        })),
      };
    }),
  };
}
