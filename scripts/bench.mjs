/**
 * Measures the portal against named yardsticks of the same run, on throw-away services:
 * `npm run bench`, or some of its figures: `npm run bench -- c d`. It prints one table of ratios.
 * Nothing passes or fails by it.
 */
import path from "node:path";
import { ensureCommands } from "./lib/debian-packages.mjs";
import { checkNodeVersion, ensureNodePackages } from "./lib/node-packages.mjs";
import { orExit, sayDetail } from "./lib/report.mjs";
import { root } from "./lib/root.mjs";
import { checkDiskSpace } from "./lib/state-folder.mjs";
import { supervisedRun } from "./lib/supervised-run.mjs";
import { makeThrowAwayFolder } from "./lib/test-services.mjs";

const letters = process.argv.slice(2);
const COMMANDS = ["setpriv", "mariadbd", "mariadb-install-db", "mariadb", "vips", "chromium"];
const asRoot = process.getuid() === 0 ? ["useradd"] : [];
const NEEDED_MB = 5_000;

orExit(checkNodeVersion);
const { folder, remove } = makeThrowAwayFolder();
orExit(() => checkDiskSpace([{ folder, neededMb: NEEDED_MB }]));
await supervisedRun({
  folder,
  root,
  work: async (children) => {
    await ensureCommands([...COMMANDS, ...asRoot], children);
    await ensureNodePackages(root, children);
    // As for the portal: versions are pinned, and the notice would stand among the figures.
    process.env.AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED = "true";
    // Only now: it needs the npm packages.
    const { bench, checkLetters } = await import("./bench/main.mjs");
    checkLetters(letters);
    await bench(children, letters);
    return 0;
  },
  whenStopped: (code) => {
    if (code !== 1) remove();
    else sayDetail(`Logs of this run are kept in ${path.join(folder, "logs")}`);
  },
});
