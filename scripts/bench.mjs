/**
 * Measures the portal as ratios against named yardsticks of the same run, on throw-away services:
 * `npm run bench`. A ratio says how many times longer the portal takes than the yardstick. Nothing
 * passes or fails by it.
 */
import { runScript } from "./lib/application.mjs";
import { ensureCommands } from "./lib/debian-packages.mjs";
import { checkNodeVersion, ensureNodePackages } from "./lib/node-packages.mjs";
import { projectScript } from "./lib/project-script.mjs";
import { orExit, step } from "./lib/report.mjs";
import { root } from "./lib/root.mjs";
import { supervisedRun } from "./lib/supervised-run.mjs";
import { makeThrowAwayFolder, startTestServices } from "./lib/test-services.mjs";

const COMMANDS = ["setpriv", "mariadbd", "mariadb-install-db", "mariadb", "vips"];

orExit(checkNodeVersion);
const { folder, remove } = makeThrowAwayFolder();
await supervisedRun({
  folder,
  root,
  whenStopped: remove,
  work: async (children) => {
    await ensureCommands(COMMANDS, children);
    await ensureNodePackages(root, children);
    const { settings } = await step("Starting throw-away services", () =>
      startTestServices(folder, children),
    );
    const context = { root, settings, children };
    await runScript({
      ...context,
      name: "migrate",
      file: "db/migrate.ts",
      explain: "The migration",
    });
    await children.run({
      name: "bench",
      ...projectScript("scripts/bench/main.ts"),
      cwd: root,
      env: settings,
      show: true,
      explain: "Measuring",
    });
    return 0;
  },
});
