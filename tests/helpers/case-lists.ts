import { database } from "@/db/client";
import { cases } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { type CaseState, STAGE_OF_STATE } from "@/lib/cases/constants";
import { type CaseList, listCases } from "@/lib/cases/list-cases";
import { type ListParams, listQuery, parseListParams } from "@/lib/cases/list-params";
import { newId } from "@/lib/new-id";
import { asRequester } from "./people";

type Columns = Partial<typeof cases.$inferInsert> & { state?: CaseState };

let made = 0;

/** Cases of the requester written straight to the table, many at once. Gives their ids. */
export async function manyCases(given: readonly Columns[]): Promise<string[]> {
  const requester = await asRequester();
  const rows = given.map((columns) => {
    const state = columns.state ?? "submitted";
    made += 1;
    return {
      id: newId("case"),
      number: state === "draft" ? null : `RL-2026-${String(2000 + made)}`,
      organisationId: requester.organisationId,
      requesterId: requester.id,
      title: "A shaft that broke",
      stage: STAGE_OF_STATE[state],
      ...columns,
      state,
    };
  });
  await database().insert(cases).values(rows);
  return rows.map(({ id }) => id);
}

/** A list as its address asks for it. */
export const listOf = (actor: Actor, query: string): Promise<CaseList> =>
  listCases(actor, parseListParams(Object.fromEntries(new URLSearchParams(query))));

export const idsOf = async (actor: Actor, query: string) =>
  (await listOf(actor, query)).rows.map(({ id }) => id);

/**
 * Ids of every row, page after page, following the addresses of the screen. `between` happens after
 * each page. Stops with an error where the pages do not end.
 */
export async function walk(
  actor: Actor,
  change: Partial<ListParams>,
  between?: (page: number) => Promise<unknown>,
): Promise<string[]> {
  const seen: string[] = [];
  let query = listQuery(parseListParams({}), change);
  for (let page = 1; page <= 50; page += 1) {
    const { rows, next } = await listOf(actor, query);
    seen.push(...rows.map(({ id }) => id));
    if (next === null) return seen;
    const params = parseListParams(Object.fromEntries(new URLSearchParams(query)));
    query = listQuery(params, { after: next });
    await between?.(page);
  }
  throw new Error("the pages of the list do not end");
}
