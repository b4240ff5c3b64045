/** The checks that need no database, in well under a minute: format, lint, types and pure tests. */
import { checkNodeVersion, ensureNodePackages } from "./lib/node-packages.mjs";
import { orExit, say } from "./lib/report.mjs";
import { root } from "./lib/root.mjs";
import { supervisedRun } from "./lib/supervised-run.mjs";
import { TestCounts } from "./lib/test-counts.mjs";
import { makeThrowAwayFolder } from "./lib/test-services.mjs";
import { checks, runCheck, runTests } from "./lib/test-stages.mjs";

orExit(checkNodeVersion);
const counts = new TestCounts();
const { folder, remove } = makeThrowAwayFolder();

await supervisedRun({
  folder,
  root,
  work: async (children) => {
    await ensureNodePackages(root, children);
    const common = { children, counts };
    await runCheck({ name: "format", parts: [checks.format], ...common });
    await runCheck({ name: "lint", parts: [checks.lint], ...common });
    await runCheck({ name: "types", parts: [checks.routeTypes, checks.types], ...common });
    await runTests({ name: "tests", projects: ["pure"], env: {}, ...common });
    return counts.failed === 0 ? 0 : 1;
  },
  whenStopped: () => {
    remove();
    say(counts.lastLine);
  },
});
