import "server-only";
import {
  and,
  asc,
  between,
  desc,
  eq,
  gt,
  inArray,
  isNotNull,
  isNull,
  like,
  lt,
  or,
  type SQL,
  sql,
} from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { database } from "@/db/client";
import { cases, organisations, people } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import { type CaseState, STAGE_OF_STATE } from "./constants";
import { type Cursor, decodeCursor, encodeCursor } from "./cursor";
import type { CaseListRow } from "./list-row";
import { type ListParams, PAGE_SIZE, type Sort } from "./list-params";
import { caseNumberPrefix, fullTextQuery } from "./search-terms";
import { visibleCases } from "./visible";

export type CaseList = { rows: CaseListRow[]; next: string | null };

const COLUMN = {
  due: cases.dueKey,
  changed: cases.changedAt,
  number: cases.number,
  title: cases.title,
  stage: cases.stage,
} as const satisfies Record<Sort, unknown>;

function matches(typed: string): SQL | undefined {
  if (typed === "") return undefined;
  const number = caseNumberPrefix(typed);
  const words = fullTextQuery(typed);
  return or(
    number === null ? undefined : like(cases.number, `${number}%`),
    words === null
      ? undefined
      : sql`match(${cases.title}, ${cases.partName}, ${cases.drawingNumber}, ${cases.serialNumber}, ${cases.heatNumber}, ${cases.material}) against (${words} in boolean mode)`,
    number === null && words === null
      ? like(cases.title, `${typed.replace(/[\\%_]/g, "\\$&")}%`)
      : undefined,
  );
}

/** The stage says no more than the state, but it has an index. */
const inState = (state: CaseState) =>
  and(eq(cases.stage, STAGE_OF_STATE[state]), eq(cases.state, state));

function filters(actor: Actor, params: ListParams): SQL | undefined {
  return and(
    params.stages.length > 0 ? inArray(cases.stage, params.stages) : undefined,
    params.client === "" ? undefined : eq(cases.organisationId, params.client),
    params.investigator === "" ? undefined : eq(cases.investigatorId, params.investigator),
    params.hold === "yes" ? eq(cases.isOnHold, true) : undefined,
    params.view === "" && params.ended === "" && params.q === ""
      ? or(
          between(cases.stage, 1, 6),
          and(eq(cases.state, "draft"), eq(cases.requesterId, actor.id)),
        )
      : undefined,
    params.view === "mine"
      ? or(
          eq(cases.investigatorId, actor.id),
          eq(cases.leadId, actor.id),
          eq(cases.secondReaderId, actor.id),
          eq(cases.requesterId, actor.id),
        )
      : undefined,
    params.view === "signature" ? inState("in_approval") : undefined,
    params.view === "client" ? inState("info_needed") : undefined,
  );
}

/** Sort value of a place, as the column holds it; undefined where an address holds something else. */
function placeValue(sort: Sort, value: Cursor[0]): string | number | Date | null | undefined {
  switch (sort) {
    case "due":
    case "stage":
      return typeof value === "number" ? value : undefined;
    case "title":
      return typeof value === "string" ? value : undefined;
    case "number":
      return typeof value === "number" ? undefined : value;
    case "changed": {
      const at = new Date(typeof value === "string" ? value : Number.NaN);
      return Number.isNaN(at.getTime()) ? undefined : at;
    }
  }
}

/** Rows after a place. MariaDB puts rows without a value first when rising, last when falling. */
function afterCursor({ after, sort, dir }: ListParams): SQL | undefined {
  const cursor = decodeCursor(after);
  const value = cursor ? placeValue(sort, cursor[0]) : undefined;
  if (!cursor || value === undefined) return undefined;
  const column = COLUMN[sort];
  const past = dir === "asc" ? gt : lt;
  const laterId = past(cases.id, cursor[1]);
  if (value === null) {
    const sameValue = and(isNull(column), laterId);
    return dir === "asc" ? or(isNotNull(column), sameValue) : sameValue;
  }
  const withoutValue = sort === "number" && dir === "desc" ? isNull(column) : undefined;
  return or(past(column, value), and(eq(column, value), laterId), withoutValue);
}

/** One page of the cases this person may see, found by keyset: as quick at the end as at the start. */
export async function listCases(actor: Actor, params: ListParams): Promise<CaseList> {
  requireAllowed(actor, "case.list");
  const investigators = alias(people, "investigators");
  const direction = params.dir === "asc" ? asc : desc;
  const column = COLUMN[params.sort];
  const found = await database()
    .select({
      row: cases,
      client: organisations.name,
      investigator: investigators.name,
    })
    .from(cases)
    // Every case has an organisation. An inner join would let the planner begin with the organisations,
    // read all their cases and sort them for one page.
    .leftJoin(organisations, eq(organisations.id, cases.organisationId))
    .leftJoin(investigators, eq(investigators.id, cases.investigatorId))
    .where(and(visibleCases(actor), filters(actor, params), matches(params.q), afterCursor(params)))
    .orderBy(direction(column), direction(cases.id))
    .limit(PAGE_SIZE + 1);
  const page = found.slice(0, PAGE_SIZE);
  const last = found.length > PAGE_SIZE ? page.at(-1)?.row : undefined;
  return {
    rows: page.map(({ row, client, investigator }) => ({
      id: row.id,
      number: row.number,
      title: row.title || row.partName || "Field return without a part yet",
      client: client ?? "",
      material: row.material,
      state: row.state,
      isOnHold: row.isOnHold,
      investigator,
      itemCount: row.itemCount,
      openGateCount: row.openGateCount,
      dueOn: row.dueOn,
      signedAt: row.signedAt?.toISOString() ?? null,
      changedAt: row.changedAt.toISOString(),
    })),
    next: last ? encodeCursor([sortValue(last, params.sort), last.id]) : null,
  };
}

function sortValue(row: typeof cases.$inferSelect, sort: Sort): Cursor[0] {
  switch (sort) {
    case "due":
      return row.dueKey ?? 0;
    case "changed":
      return row.changedAt.toISOString();
    case "number":
      return row.number;
    case "title":
      return row.title;
    case "stage":
      return row.stage;
  }
}

/** How many cases a view holds, counted up to `atMost` so that it stays cheap. */
export async function countCases(
  actor: Actor,
  params: ListParams,
  atMost: number,
): Promise<number> {
  requireAllowed(actor, "case.list");
  const direction = params.dir === "asc" ? asc : desc;
  const some = database()
    .select({ id: cases.id })
    .from(cases)
    .where(and(visibleCases(actor), filters(actor, params), matches(params.q)))
    // In the list's own order, so that its index is read until enough are found, and nothing is
    // gathered from several first. Words are found through their own index.
    .orderBy(...(params.q === "" ? [direction(COLUMN[params.sort]), direction(cases.id)] : []))
    .limit(atMost)
    .as("some");
  const [row] = await database()
    .select({ n: sql<number>`count(*)`.mapWith(Number) })
    .from(some);
  return row?.n ?? 0;
}
