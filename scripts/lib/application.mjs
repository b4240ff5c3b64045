import { setTimeout as sleep } from "node:timers/promises";
import { projectScript } from "./project-script.mjs";
import { Failure, formatDuration, say } from "./report.mjs";
import { forgetBuild, isBuilt, rememberBuild, sourceStamp } from "./source-stamp.mjs";
import path from "node:path";

const NEXT = "node_modules/next/dist/bin/next";

/** Runs a TypeScript task of the project to its end. */
export function runScript({ name, file, args, explain, root, settings, children }) {
  return children.run({
    name,
    ...projectScript(file, args),
    cwd: root,
    env: settings,
    explain,
  });
}

/** Builds the portal unless the build at hand was made from exactly these sources. */
export async function ensureBuild({ root, settings, children, announce, distFolder = ".next" }) {
  const folder = path.join(root, distFolder);
  const stamp = sourceStamp(root);
  if (isBuilt(folder, stamp)) return;
  await announce(async () => {
    forgetBuild(folder);
    await children.run({
      name: "build",
      command: process.execPath,
      args: [NEXT, "build"],
      cwd: root,
      env: { ...settings, NEXT_DIST_DIR: distFolder },
      explain: "Building the portal",
    });
    rememberBuild(folder, stamp);
  });
}

/** Starts the web server on loopback and waits until it says that it is well. */
export async function startWeb({ root, settings, webPort, children, mode, distFolder = ".next" }) {
  const entry = children.start({
    name: "web",
    command: process.execPath,
    args: [NEXT, mode, "-H", "127.0.0.1", "-p", String(webPort)],
    cwd: root,
    env: { ...settings, NEXT_DIST_DIR: distFolder },
  });
  const health = `http://127.0.0.1:${webPort}/api/health`;
  let last = "no answer";
  const isWell = async () => {
    try {
      const answer = await fetch(health, { signal: AbortSignal.timeout(30_000) });
      last = `${answer.status} ${(await answer.text()).slice(0, 300)}`;
      return answer.status === 200;
    } catch (error) {
      last = `no answer (${error.cause?.code ?? error.name})`;
      return false;
    }
  };
  try {
    await children.waitUntilReady(entry, isWell, { seconds: 90, what: "The web server" });
  } catch (error) {
    if (error instanceof Failure) error.message += `\nLast answer of ${health}: ${last}`;
    throw error;
  }
  children.guard(entry, "The web server");
}

const WORKER_TRIES = 5;
const STEADY_MS = 10 * 60_000;

/** Starts the worker for background jobs, and again when it crashes; a crash loses no job. */
export function superviseWorker({ root, settings, children }) {
  let crashes = 0;
  const launch = () => {
    const begun = Date.now();
    const entry = children.start({
      name: "worker",
      ...projectScript("scripts/worker.ts"),
      cwd: root,
      env: settings,
    });
    void entry.ended.then(async (exit) => {
      if (children.stopping) return;
      crashes = Date.now() - begun > STEADY_MS ? 1 : crashes + 1;
      const what = `The worker for background jobs ended unexpectedly (${exit.text})`;
      if (crashes > WORKER_TRIES) {
        children.onCrash(
          new Failure(
            `${what}, ${crashes} times in a row.`,
            `Its log is ${entry.logFile}.`,
            "Its jobs are kept in the database and run at the next start.",
          ),
        );
        return;
      }
      const wait = 1000 * 2 ** (crashes - 1);
      say(`${what}. Starting it again in ${formatDuration(wait)}; its log is ${entry.logFile}.`);
      await sleep(wait);
      if (!children.stopping) launch();
    });
  };
  launch();
}
