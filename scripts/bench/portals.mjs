import { readFileSync } from "node:fs";
import path from "node:path";
import { runScript } from "../lib/application.mjs";
import { administer } from "../lib/mariadb.mjs";
import { choosePort } from "../lib/ports.mjs";
import { root } from "../lib/root.mjs";
import { TEST_BUILD } from "../lib/test-stages.mjs";
import { signIn } from "./http-client.mjs";
import { nextStart, startUntilReady } from "./servers.mjs";

/**
 * A portal with a database of `count` cases, serving, and an investigator signed in to it.
 * @returns process, address, settings, cookie, a case to work on, and a place half way in the list
 */
export async function startPortal({ children, settings, name, count }) {
  const { folder } = children;
  // Named as the schemas that the account of throw-away services may use.
  const schema = `riverline_test_${name}`;
  administer(path.join(folder, "mysql"), `create database ${schema}`);
  const database = new URL(settings.DATABASE_URL);
  database.pathname = schema;
  const port = await choosePort();
  const base = `http://127.0.0.1:${port}`;
  const own = { ...settings, DATABASE_URL: database.toString(), NEXTAUTH_URL: base };
  const file = path.join(folder, `${name}.json`);
  await runScript({
    root,
    settings: own,
    children,
    name: `fill-${name}`,
    file: "scripts/bench/fill.ts",
    args: [String(count), file],
    explain: "Filling in cases",
  });
  const { entry } = await startUntilReady(children, {
    ...nextStart({ name: `web-${name}`, port, env: { ...own, NEXT_DIST_DIR: TEST_BUILD } }),
    address: `${base}/api/health`,
  });
  const filled = JSON.parse(readFileSync(file, "utf8"));
  return { entry, base, settings: own, ...filled, cookie: await signIn(base, filled) };
}
