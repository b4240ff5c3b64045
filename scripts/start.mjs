/**
 * Starts Riverline with everything it needs on this machine. Uses Node alone until the npm
 * packages are there. README.md says what it does; each step is printed as it happens.
 */
import { existsSync } from "node:fs";
import path from "node:path";
import { ensureBuild, runScript, startWeb, superviseWorker } from "./lib/application.mjs";
import { ensureCommands } from "./lib/debian-packages.mjs";
import { sayDemoAccounts } from "./lib/demo-accounts.mjs";
import { endLeftOvers } from "./lib/left-overs.mjs";
import { startLocalDatabase, startLocalMail, startLocalStore } from "./lib/local-services.mjs";
import { takeLock } from "./lib/lock-file.mjs";
import { checkNodeVersion, ensureNodePackages } from "./lib/node-packages.mjs";
import { isPortFree, readPort } from "./lib/ports.mjs";
import { writePrivateJson } from "./lib/private-file.mjs";
import { Failure, formatDuration, orExit, say, sayBold, sayDetail, step } from "./lib/report.mjs";
import { root } from "./lib/root.mjs";
import { localPorts, localSecrets } from "./lib/secrets.mjs";
import { effectiveSettings, externalServices, givenSettings } from "./lib/settings.mjs";
import {
  checkDiskSpace,
  FIRST_START_MB,
  LATER_START_MB,
  prepareStateFolder,
  stateFolderFor,
} from "./lib/state-folder.mjs";
import { supervisedRun } from "./lib/supervised-run.mjs";

orExit(checkNodeVersion);
const dev = process.argv.includes("--dev");
const given = givenSettings(root);
const distFolder = given.NEXT_DIST_DIR;
const external = externalServices(given);
const folder = stateFolderFor({
  root,
  isRoot: process.getuid() === 0,
  chosen: given.RIVERLINE_STATE,
});

function alreadyRunning(holder) {
  return new Failure(
    `Riverline is already running on ${folder} (process ${holder.pid}, since ${holder.since}).`,
    "Use that one, or stop it first (Ctrl-C in its window, or kill its process). " +
      "For a second, separate one set RIVERLINE_STATE and PORT.",
    "Nothing was changed.",
  );
}

async function checkPort(webPort) {
  if (await isPortFree(webPort)) return;
  throw new Failure(
    `Port ${webPort} on 127.0.0.1 is used by another program.`,
    `Stop that program, or start Riverline on another port, for example: PORT=${webPort + 1} npm ${dev ? "run dev" : "start"}`,
    "Nothing was changed.",
  );
}

function checkSpace() {
  const first = existsSync(path.join(folder, "environment.json")) ? LATER_START_MB : FIRST_START_MB;
  const firstInRoot = existsSync(path.join(root, "node_modules")) ? LATER_START_MB : FIRST_START_MB;
  checkDiskSpace([
    { folder, neededMb: first },
    { folder: root, neededMb: firstInRoot },
  ]);
}

async function start(children) {
  const begun = performance.now();
  const webPort = readPort(given.PORT);
  const leftOver = await endLeftOvers(folder);
  if (leftOver.length > 0) {
    sayDetail(`An earlier start was cut short; ended what it left running: ${leftOver.join(", ")}`);
  }
  await checkPort(webPort);
  await ensureCommands(neededCommands(), children);
  await ensureNodePackages(root, children);

  const secrets = localSecrets(folder);
  const ports = await localPorts(folder, webPort);
  const settings = effectiveSettings({ given, external, secrets, ports, webPort });
  settings.NODE_ENV = dev ? "development" : "production";
  const context = { root, folder, secrets, ports, settings, webPort, children };

  await step("Checking the settings", () =>
    runScript({
      ...context,
      name: "settings",
      file: "scripts/check-env.ts",
      explain: "The check of the settings",
    }),
  );
  writePrivateJson(path.join(folder, "environment.json"), settings);
  await startServices(context);
  await prepareDatabase(context);
  await step("Starting the worker for background jobs", () => superviseWorker(context));
  if (!dev) {
    const announce = (build) => step("Building the portal (about a minute)", build);
    await ensureBuild({ ...context, announce, distFolder });
  }
  await step(`Starting the web server on 127.0.0.1:${webPort}`, () =>
    startWeb({ ...context, mode: dev ? "dev" : "start", distFolder }),
  );
  children.up = true;
  sayReady(settings, performance.now() - begun);
  return new Promise(() => undefined);
}

function neededCommands() {
  const database = ["mariadbd", "mariadb-install-db", "mariadb"];
  const asRoot = process.getuid() === 0 ? ["useradd"] : [];
  return ["setpriv", ...(external.database ? [] : [...database, ...asRoot])];
}

async function startServices(context) {
  const services = [
    [external.database, "MariaDB", startLocalDatabase],
    [external.store, "the object store", startLocalStore],
    [external.mail, "the mail sink", startLocalMail],
  ].filter(([elsewhere]) => !elsewhere);
  if (services.length === 0) return;
  const names = services.map(([, name]) => name).join(", ");
  await step(`Starting ${names}`, () =>
    Promise.all(services.map(([, , startService]) => startService(context))),
  );
}

async function prepareDatabase(context) {
  await step("Bringing the database up to date", () =>
    runScript({ ...context, name: "migrate", file: "db/migrate.ts", explain: "The migration" }),
  );
  if (!["1", "true"].includes(context.settings.RIVERLINE_DEMO)) return;
  await step("Filling in the demonstration (once)", () =>
    runScript({
      ...context,
      name: "seed",
      file: "db/seed/main.ts",
      explain: "Filling in the demonstration",
    }),
  );
}

function sayReady(settings, took) {
  say();
  sayBold(`Riverline is ready at ${settings.NEXTAUTH_URL} (after ${formatDuration(took)})`);
  if (["1", "true"].includes(settings.RIVERLINE_DEMO)) sayDemoAccounts();
  if (settings.MAIL_SINK_URL) say(`  Mail it sends can be read at ${settings.MAIL_SINK_URL}`);
  say(`  Data and logs are in ${folder}`);
  say("  Ctrl-C stops everything and keeps all data.");
}

const lock = orExit(() => {
  say(`Riverline, state in ${folder}`);
  checkSpace();
  prepareStateFolder(folder);
  return takeLock(path.join(folder, "lock"), { busy: alreadyRunning });
});
await supervisedRun({ folder, root, work: start, whenStopped: () => lock.release() });
