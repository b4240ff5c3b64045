/**
 * Runs every check and test with throw-away services of its own, and ends with one line:
 * `N passed, N failed`.
 *
 *   node scripts/test.mjs                              everything
 *   node scripts/test.mjs --only services [filter ...] one project: pure, components, services, journeys
 *   node scripts/test.mjs --services                   keeps services up for fast runs of --only services
 */
import path from "node:path";
import { ensureBuild, runScript, startWeb, superviseWorker } from "./lib/application.mjs";
import { ensureCommands } from "./lib/debian-packages.mjs";
import { endLeftOvers } from "./lib/left-overs.mjs";
import { takeLock } from "./lib/lock-file.mjs";
import { checkNodeVersion, ensureNodePackages } from "./lib/node-packages.mjs";
import {
  Failure,
  formatDuration,
  orExit,
  say,
  sayBold,
  sayDetail,
  Stopped,
  step,
} from "./lib/report.mjs";
import { root } from "./lib/root.mjs";
import { checkDiskSpace, LATER_START_MB, prepareStateFolder } from "./lib/state-folder.mjs";
import { supervisedRun } from "./lib/supervised-run.mjs";
import { TestCounts } from "./lib/test-counts.mjs";
import {
  keptFolder,
  keptServices,
  makeThrowAwayFolder,
  startTestServices,
} from "./lib/test-services.mjs";
import { checks, runCheck, runTests, TEST_BUILD } from "./lib/test-stages.mjs";

const PROJECTS = ["pure", "components", "services", "journeys"];
const counts = new TestCounts();

const database = ["setpriv", "mariadbd", "mariadb-install-db", "mariadb"];
const asRoot = process.getuid() === 0 ? ["useradd"] : [];
const outsideTools = ["chromium", "pdfinfo", "pdftotext", "identify", "exiftool", "vips"];

async function prepare(children, commands) {
  await ensureCommands(commands, children);
  await ensureNodePackages(root, children);
}

const startServices = (children) =>
  step("Starting throw-away database, object store and mail sink", () =>
    startTestServices(children.folder, children),
  );

/** A stage that cannot even run counts as one failure, and the next stage still gets its turn. */
async function stage(name, work) {
  try {
    await work();
  } catch (error) {
    if (error instanceof Stopped) throw error;
    process.stderr.write(`\n${error instanceof Failure ? error.message : error.stack}\n`);
    counts.add(name, 0, 1);
  }
}

async function everything(children) {
  await prepare(children, [...database, ...asRoot, ...outsideTools]);
  const common = { children, counts };
  await stage("format", () => runCheck({ name: "format", parts: [checks.format], ...common }));
  await stage("lint", () => runCheck({ name: "lint", parts: [checks.lint], ...common }));
  const typeParts = [checks.routeTypes, checks.types];
  await stage("types", () => runCheck({ name: "types", parts: typeParts, ...common }));
  await stage("tests", async () => {
    const { settings, webPort } = await startServices(children);
    const projects = ["pure", "components", "services"];
    await runTests({ name: "tests", projects, env: settings, ...common });
    await stage("build", () => build(children, settings));
    await stage("journeys", () => journeys(children, settings, webPort, []));
  });
}

async function build(children, settings) {
  sayBold("\n== build");
  const announce = (work) => step("Building the portal", work);
  await ensureBuild({
    root,
    settings: production(settings),
    children,
    announce,
    distFolder: TEST_BUILD,
  });
  counts.add("build", 1, 0);
}

const production = (settings) => ({ ...settings, NODE_ENV: "production" });

async function journeys(children, settings, webPort, filters) {
  sayBold("\n== the portal for the journeys");
  const context = { root, settings: production(settings), webPort, children };
  const migrate = { name: "migrate", file: "db/migrate.ts", explain: "The migration" };
  const seed = { name: "seed", file: "db/seed/main.ts", explain: "Filling in the demonstration" };
  await step("Bringing the database up to date", () => runScript({ ...context, ...migrate }));
  await step("Filling in the demonstration", () => runScript({ ...context, ...seed }));
  superviseWorker(context);
  await step("Starting the web server", () =>
    startWeb({ ...context, mode: "start", distFolder: TEST_BUILD }),
  );
  const env = { ...settings, NEXT_DIST_DIR: TEST_BUILD };
  await runTests({ name: "journeys", projects: ["journeys"], filters, env, children, counts });
}

async function onlyOne(children, project, filters) {
  if (!PROJECTS.includes(project)) {
    throw new Failure(
      `There is no test project "${project ?? ""}".`,
      `Name one of: ${PROJECTS.join(", ")}.`,
    );
  }
  if (project === "journeys") {
    await prepare(children, [...database, ...asRoot, ...outsideTools]);
    const { settings, webPort } = await startServices(children);
    await build(children, settings);
    await journeys(children, settings, webPort, filters);
    return;
  }
  await prepare(children, project === "services" ? [...database, ...asRoot] : ["setpriv"]);
  const env = project === "services" ? await servicesFor(children) : {};
  await runTests({ name: project, projects: [project], filters, env, children, counts });
}

async function servicesFor(children) {
  const kept = keptServices();
  if (kept) {
    sayDetail(`Using the services that are kept up in ${keptFolder()}`);
    return kept;
  }
  const { settings } = await startServices(children);
  return settings;
}

/** Serves tests until somebody stops it. */
async function keepServices() {
  const folder = keptFolder();
  const busy = ({ pid }) => new Failure(`Test services are already kept up by process ${pid}.`);
  const lock = orExit(() => {
    prepareStateFolder(folder);
    return takeLock(path.join(folder, "lock"), { busy });
  });
  await endLeftOvers(folder);
  await supervisedRun({
    folder,
    root,
    whenStopped: () => lock.release(),
    work: async (children) => {
      await prepare(children, [...database, ...asRoot]);
      await startServices(children);
      children.up = true;
      say(`Test services are up. Run: node scripts/test.mjs --only services [filter ...]`);
      return new Promise(() => undefined);
    },
  });
}

async function runAndReport(work) {
  const begun = performance.now();
  const { folder, remove } = makeThrowAwayFolder();
  orExit(() => checkDiskSpace([{ folder, neededMb: LATER_START_MB * 2 }]));
  await supervisedRun({
    folder,
    root,
    work: async (children) => {
      await work(children);
      return counts.failed === 0 ? 0 : 1;
    },
    whenStopped: (code) => {
      if (code !== 0 && counts.failed === 0) counts.add("the run itself", 0, 1);
      if (counts.failed === 0) remove();
      else sayDetail(`\nLogs of this run are kept in ${path.join(folder, "logs")}`);
      for (const { name, passed, failed } of counts.stages) {
        sayDetail(`${name.padEnd(12)} ${passed} passed, ${failed} failed`);
      }
      sayDetail(`${formatDuration(performance.now() - begun)} in all`);
      say(counts.lastLine);
    },
  });
}

orExit(checkNodeVersion);
const [flag, project, ...filters] = process.argv.slice(2);
if (flag === "--services") await keepServices();
else if (flag === "--only") await runAndReport((children) => onlyOne(children, project, filters));
else await runAndReport(everything);
