import { Failure, say, Stopped } from "./report.mjs";
import { Children } from "./children.mjs";
import { fullDiskHint } from "./state-folder.mjs";

const SIGNALS = ["SIGINT", "SIGTERM", "SIGHUP"];
const SIGNAL_NUMBER = { SIGINT: 2, SIGTERM: 15, SIGHUP: 1 };

/**
 * Runs `work` with a set of children. However it ends (done, failed, a child that crashed, a signal)
 * every child is stopped before the process exits.
 * @param work gets `children`; resolves to the exit code
 */
export async function supervisedRun({ folder, root, work, whenStopped = () => undefined }) {
  const children = new Children(folder);
  const interrupted = listenForSignals(children);
  const crashed = new Promise((_, reject) => {
    children.onCrash = reject;
  });
  // A closed terminal must not end the command before it has stopped its children.
  process.stdout.on("error", () => undefined);

  let code;
  try {
    code = await Promise.race([work(children), crashed, interrupted]);
  } catch (error) {
    code = explain(error, [folder, root]);
  }
  await children.stopAll();
  whenStopped(code);
  process.exitCode = code;
  // Whatever still waits (a timer of a step that was cut short) must not hold the command up.
  process.stdout.write("", () => process.exit(code));
}

function listenForSignals(children) {
  let stopping = false;
  return new Promise((resolve) => {
    for (const signal of SIGNALS) {
      // Stays installed: npm passes Ctrl-C on a second time, and the stop must not be cut short.
      process.on(signal, () => {
        if (!stopping) say(`\nStopping everything (${signal}) ...`);
        stopping = true;
        // Stopping a server that was up is its normal end; stopping a start is not.
        resolve(children.up ? 0 : 128 + SIGNAL_NUMBER[signal]);
      });
    }
  });
}

function explain(error, folders) {
  if (error instanceof Stopped) return 1;
  const known = error instanceof Failure || error.code === "ENOSPC";
  process.stderr.write(`\n${known ? error.message : error.stack}\n`);
  const hint = fullDiskHint(folders);
  if (hint) process.stderr.write(`${hint}\n`);
  return 1;
}
