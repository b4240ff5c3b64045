import { STAGES } from "./constants";

export const SORTS = ["due", "changed", "number", "title", "stage"] as const;
export type Sort = (typeof SORTS)[number];
export const DIRECTIONS = ["asc", "desc"] as const;
const VIEW_KEYS = ["", "mine", "signature", "client", "all"] as const;
export const PAGE_SIZE = 50;
export const SEARCH_MAX = 200;
/** Longest place in an address: a title of 200 control characters, as JSON in Base64. */
export const CURSOR_MAX = 2000;
const ID_MAX = 40;
const YES_OR_NOT = ["yes", ""] as const;

/** The address of the case list: what is shown, in what order, from where. */
export type ListParams = {
  q: string;
  stages: number[];
  client: string;
  investigator: string;
  hold: (typeof YES_OR_NOT)[number];
  ended: (typeof YES_OR_NOT)[number];
  sort: Sort;
  dir: (typeof DIRECTIONS)[number];
  after: string;
  view: (typeof VIEW_KEYS)[number];
  /** The kept view that this began as; it filters nothing by itself. */
  saved: string;
};

type Search = Record<string, string | string[] | undefined>;

const oneOf = <T extends string>(known: readonly T[], typed: string, usual: T): T =>
  known.find((value) => value === typed) ?? usual;
const noLonger = (max: number, typed: string) => (typed.length <= max ? typed : "");

/**
 * Reads the address of a list; values that are not known fall away. By hand, not by a schema: the
 * frame of every page makes such addresses, and would take the whole schema package to the browser.
 */
export function parseListParams(search: Search): ListParams {
  const one = (name: string) => {
    const value = search[name];
    return (Array.isArray(value) ? value[0] : value) ?? "";
  };
  return {
    q: noLonger(SEARCH_MAX, one("q").trim()),
    stages: one("stages")
      .split("-")
      .map(Number)
      .filter((stage) => Number.isInteger(stage) && stage >= 1 && stage <= STAGES.length),
    client: noLonger(ID_MAX, one("client")),
    investigator: noLonger(ID_MAX, one("investigator")),
    hold: oneOf(YES_OR_NOT, one("hold"), ""),
    ended: oneOf(YES_OR_NOT, one("ended"), ""),
    sort: oneOf(SORTS, one("sort"), "due"),
    dir: oneOf(DIRECTIONS, one("dir"), "asc"),
    after: noLonger(CURSOR_MAX, one("after")),
    view: oneOf(VIEW_KEYS, one("view"), ""),
    saved: noLonger(ID_MAX, one("saved")),
  };
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
