import { askWell } from "./http-client.mjs";
import { inPairs, timeOf } from "./measure.mjs";

const HOW = { pairs: 20, warmUps: 6 };

/** A page as a browser asks for it. */
const page = (portal, address) => async () =>
  timeOf(() =>
    askWell(`${portal.base}${address}`, {
      headers: { cookie: portal.cookie, accept: "text/html", "accept-encoding": "gzip" },
    }),
  );

/** The case list of a full laboratory against the same page of a young one. */
export async function measureCaseList(few, many) {
  const pairsOf = (address, other = address) =>
    inPairs({ product: page(many, address), yardstick: page(few, other) }, HOW);
  const rows = [];
  const add = async (what, against, address, other) =>
    rows.push({ letter: "c", what, against, ...(await pairsOf(address, other)) });
  await add("case list with 100 000 cases", "the same page with 1 000 cases", "/cases");
  await add(
    "case list with 100 000 cases, all of them, half way through",
    "the first page of all of 1 000 cases",
    `/cases?view=all&after=${many.halfWay}`,
    "/cases?view=all",
  );
  await add(
    "search for a word that stands in 8 333 of 100 000 cases",
    "the same search with 1 000 cases",
    "/cases?view=all&q=shaft",
  );
  await add(
    "search for one drawing number among 100 000 cases",
    "the same search with 1 000 cases",
    "/cases?view=all&q=HD-000500",
  );
  return rows;
}

/** The case list against the lightest that the portal answers to somebody signed in. */
export async function measureSignedIn(few) {
  const list = page(few, "/cases");
  const ownAccount = await inPairs({ product: list, yardstick: page(few, "/me") }, HOW);
  const session = await inPairs({ product: list, yardstick: page(few, "/api/session") }, HOW);
  const what = "case list with 1 000 cases";
  return [
    { letter: "d", what, against: "the portal's barest page, Your account", ...ownAccount },
    { letter: "d", what, against: "a route that asks the session only, /api/session", ...session },
  ];
}
