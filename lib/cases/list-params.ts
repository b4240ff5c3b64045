import { z } from "zod";
import { STAGES } from "./constants";
import { CURSOR_MAX } from "./cursor";

export const SORTS = ["due", "changed", "number", "title", "stage"] as const;
export type Sort = (typeof SORTS)[number];
export const DIRECTIONS = ["asc", "desc"] as const;
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
  asked: z.enum(["yes", ""]).catch(""),
  approval: z.enum(["yes", ""]).catch(""),
  sort: z.enum(SORTS).catch("due"),
  dir: z.enum(DIRECTIONS).catch("asc"),
  after: z.string().max(CURSOR_MAX).catch(""),
  view: z.string().max(40).catch(""),
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
    asked: one("asked"),
    approval: one("approval"),
    sort: one("sort") || "due",
    dir: one("dir") || "asc",
    after: one("after"),
    view: one("view"),
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
  set("asked", next.asked);
  set("approval", next.approval);
  set("sort", next.sort, "due");
  set("dir", next.dir, "asc");
  set("after", next.after);
  return query.toString();
}

/** Views everyone has. `mine` and `approval` are filled in for the person. */
export const BUILT_IN_VIEWS = [
  { key: "", name: "Open and recent" },
  { key: "mine", name: "Mine" },
  { key: "signature", name: "Waiting for signature" },
  { key: "client", name: "Waiting for client" },
  { key: "all", name: "All" },
] as const;
