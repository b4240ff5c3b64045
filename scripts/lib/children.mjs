import { spawn } from "node:child_process";
import {
  closeSync,
  createWriteStream,
  openSync,
  readFileSync,
  renameSync,
  statSync,
  writeSync,
} from "node:fs";
import path from "node:path";
import { originMarks } from "./left-overs.mjs";
import { Failure, sayDetail, Stopped } from "./report.mjs";
import { setTimeout as sleep } from "node:timers/promises";

const GRACE_MS = 15_000;
const OLD_LOG_BYTES = 5 * 1024 * 1024;

const STARTED = "--- started ";

/** The last lines of a log since its process was started, for a message about why it ended. */
export function tail(file, lines = 12) {
  try {
    const all = readFileSync(file, "utf8").trimEnd().split("\n");
    const begun = all.findLastIndex((line) => line.startsWith(STARTED));
    return all
      .slice(begun + 1)
      .slice(-lines)
      .join("\n");
  } catch (error) {
    if (error.code === "ENOENT") return "";
    throw error;
  }
}

function openLog(file) {
  try {
    if (statSync(file).size > OLD_LOG_BYTES) renameSync(file, `${file}.old`);
  } catch (error) {
    if (error.code !== "ENOENT") throw error;
  }
  const log = openSync(file, "a", 0o600);
  writeSync(log, `${STARTED}${new Date().toISOString()}\n`);
  return log;
}

function copyOutput(child, logFile) {
  const log = createWriteStream(logFile, { flags: "a", mode: 0o600 });
  // A log that cannot be written must not end the command: the output is on the screen as well.
  log.on("error", (error) => sayDetail(`${logFile}: ${error.message}`));
  for (const stream of [child.stdout, child.stderr]) {
    stream.on("data", (chunk) => {
      process.stdout.write(chunk);
      log.write(chunk);
    });
  }
  child.once("close", () => log.end());
}

function describeExit(code, signal) {
  return signal ? `signal ${signal}` : `exit code ${code}`;
}

/**
 * The processes that one command started: long-running ones and one-off tasks. Each gets its own
 * process group, so that Ctrl-C reaches only the command, which then stops them in order; and each
 * is told by the kernel to end when the command dies without having stopped it.
 */
export class Children {
  #running = [];
  #stopping = false;

  /** Set once everything that was to be started is up. */
  up = false;

  /** Called with a Failure when a guarded process ends by itself. */
  onCrash = () => undefined;

  /** @param folder the state folder; `logs/` lies in it */
  constructor(folder) {
    this.folder = folder;
  }

  get stopping() {
    return this.#stopping;
  }

  logFile(name) {
    return path.join(this.folder, "logs", `${name}.log`);
  }

  #launch({ name, command, args, env, cwd, user, show = false }) {
    if (this.#stopping) throw new Stopped();
    const identity = user
      ? ["--reuid", String(user.uid), "--regid", String(user.gid), "--clear-groups"]
      : [];
    const logFile = this.logFile(name);
    const log = openLog(logFile);
    const out = show ? "pipe" : log;
    const child = spawn("setpriv", ["--pdeathsig", "TERM", ...identity, "--", command, ...args], {
      cwd,
      env: { ...process.env, ...env, ...originMarks(this.folder, name) },
      detached: true,
      stdio: ["ignore", out, out],
    });
    closeSync(log);
    if (show) copyOutput(child, logFile);
    const entry = { name, child, ended: undefined, exit: undefined, logFile };
    entry.ended = new Promise((resolve) => {
      child.once("error", (error) => resolve({ text: error.message, code: undefined }));
      child.once(show ? "close" : "exit", (code, signal) =>
        resolve({ text: describeExit(code, signal), code }),
      );
    }).then((exit) => {
      entry.exit = exit;
      this.#running = this.#running.filter((other) => other !== entry);
      return exit;
    });
    this.#running.push(entry);
    return entry;
  }

  /** Starts a process that is meant to run until the command stops it. */
  start(options) {
    return this.#launch(options);
  }

  /** From now on the end of this process is the end of the command. */
  guard(entry, what) {
    void entry.ended.then((exit) => {
      if (this.#stopping) return;
      sayDetail(tail(entry.logFile));
      this.onCrash(
        new Failure(
          `${what} ended unexpectedly (${exit.text}).`,
          `Its log is ${entry.logFile}. Start again; if it ends again, the log says why.`,
          "Everything else is being stopped in order; saved data is kept.",
        ),
      );
    });
  }

  /** Runs a task to its end and answers how it ended. With `show` its output is also printed. */
  async exitOf(options) {
    const exit = await this.#launch(options).ended;
    if (this.#stopping) throw new Stopped();
    return exit;
  }

  /** Runs a task that must succeed. Its output goes to its log, and is shown when it fails. */
  async run({ explain, ...options }) {
    const exit = await this.exitOf(options);
    if (exit.code === 0) return;
    const logFile = this.logFile(options.name);
    if (!options.show) sayDetail(tail(logFile, 30));
    throw new Failure(
      `${explain ?? options.name} failed (${exit.text}).`,
      `The whole output is in ${logFile}.`,
    );
  }

  /** Waits until `ready` answers true; fails when the process ends first or time is up. */
  async waitUntilReady(entry, ready, { seconds, what }) {
    const deadline = Date.now() + seconds * 1000;
    while (Date.now() < deadline) {
      if (this.#stopping) throw new Stopped();
      if (entry.exit) {
        sayDetail(tail(entry.logFile));
        throw new Failure(
          `${what} ended while it was starting (${entry.exit.text}).`,
          `Its log is ${entry.logFile}.`,
        );
      }
      if (await ready()) return;
      await sleep(100);
    }
    sayDetail(tail(entry.logFile));
    throw new Failure(
      `${what} did not become ready within ${seconds} s.`,
      `Its log is ${entry.logFile}.`,
    );
  }

  /** Stops everything, last started first, and waits until it is gone. */
  async stopAll() {
    this.#stopping = true;
    for (const entry of [...this.#running].reverse()) await this.stop(entry);
  }

  /** Stops one process that is not guarded, and waits until it is gone. */
  async stop(entry) {
    signalGroup(entry.child.pid, "SIGTERM");
    const timer = setTimeout(() => signalGroup(entry.child.pid, "SIGKILL"), GRACE_MS);
    await entry.ended;
    clearTimeout(timer);
    // A grandchild that outlived its parent is still in the group.
    signalGroup(entry.child.pid, "SIGKILL");
  }
}

function signalGroup(pid, signal) {
  if (pid === undefined) return;
  try {
    process.kill(-pid, signal);
  } catch (error) {
    if (error.code !== "ESRCH") throw error;
  }
}
