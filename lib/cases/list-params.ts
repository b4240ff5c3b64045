import { z } from "zod";
import { STAGES } from "./constants";
import { CURSOR_MAX } from "./cursor";

export const SORTS = ["due", "changed", "number", "title", "stage"] as const;
export type Sort = (typeof SORTS)[number];
export const DIRECTIONS = ["asc", "desc"] as const;
const VIEW_KEYS = ["", "mine", "signature", "client", "all"] as const;
export const PAGE_SIZE = 50;
export const SEARCH_MAX = 200;

/** The address of the case list: what is shown, in what order, from where. Unknown values fall away. */
const params = z.object({
  q: z.string().trim().max(SEARCH_MAX).catch(""),
  stages: z.string().transform((text) =>
    text
      .split("-")
      .map(Number)
      .filter((stage) => Number.isInteger(stage) && stage >= 1 && stage <= STAGES.length),
  ),
  client: z.string().max(40).catch(""),
  investigator: z.string().max(40).catch(""),
  hold: z.enum(["yes", ""]).catch(""),
  ended: z.enum(["yes", ""]).catch(""),
  sort: z.enum(SORTS).catch("due"),
  dir: z.enum(DIRECTIONS).catch("asc"),
  after: z.string().max(CURSOR_MAX).catch(""),
  view: z.enum(VIEW_KEYS).catch(""),
  /** The kept view that this began as; it filters nothing by itself. */
  saved: z.string().max(40).catch(""),
});
export type ListParams = z.infer<typeof params>;

type Search = Record<string, string | string[] | undefined>;

export function parseListParams(search: Search): ListParams {
  const one = (name: string) => {
    const value = search[name];
    return (Array.isArray(value) ? value[0] : value) ?? "";
  };
  return params.parse({
    q: one("q"),
    stages: one("stages"),
    client: one("client"),
    investigator: one("investigator"),
    hold: one("hold"),
    ended: one("ended"),
    sort: one("sort") || "due",
    dir: one("dir") || "asc",
    after: one("after"),
    view: one("view"),
    saved: one("saved"),
  });
}

/** Query string of a list, leaving out what is as usual. The place in the list goes with a change. */
export function listQuery(current: ListParams, change: Partial<ListParams> = {}): string {
  const next = { ...current, after: "", ...change };
  const query = new URLSearchParams();
  const set = (name: string, value: string, usual = "") => {
    if (value !== usual) query.set(name, value);
  };
  set("view", next.view);
  set("q", next.q);
  set("stages", next.stages.join("-"));
  set("client", next.client);
  set("investigator", next.investigator);
  set("hold", next.hold);
  set("ended", next.ended);
  set("sort", next.sort, "due");
  set("dir", next.dir, "asc");
  set("after", next.after);
  set("saved", next.saved);
  return query.toString();
}

/** What a list shows and how, without the place in it: what is kept of it under a name. */
export const queryToKeep = (params: ListParams) => listQuery(params, { saved: "" });

/** Address of a kept view: what was kept, and which one it is. */
export const keptViewQuery = (view: { id: string; query: string }) =>
  listQuery(parseListParams(Object.fromEntries(new URLSearchParams(view.query))), {
    saved: view.id,
  });

/** Views everyone has; "mine" is filled in for the person. */
export const BUILT_IN_VIEWS = [
  { key: "", name: "Open and recent" },
  { key: "mine", name: "Mine" },
  { key: "signature", name: "Waiting for signature" },
  { key: "client", name: "Waiting for client" },
  { key: "all", name: "All" },
] as const satisfies readonly { key: (typeof VIEW_KEYS)[number]; name: string }[];
