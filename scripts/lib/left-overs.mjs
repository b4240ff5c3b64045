import { readdirSync, readFileSync } from "node:fs";
import { setTimeout as sleep } from "node:timers/promises";

const GRACE_MS = 15_000;
const FOLDER_MARK = "RIVERLINE_STARTED_FROM";
const NAME_MARK = "RIVERLINE_PROCESS";

/** Marks in a child's environment, which its own children inherit. */
export function originMarks(folder, name) {
  return { [FOLDER_MARK]: folder, [NAME_MARK]: name };
}

function environmentOf(pid) {
  try {
    return readFileSync(`/proc/${pid}/environ`, "utf8").split("\0");
  } catch (error) {
    // Gone meanwhile, or another user's.
    if (["ENOENT", "ESRCH", "EACCES", "EPERM"].includes(error.code)) return [];
    throw error;
  }
}

function processesStartedFrom(folder) {
  return readdirSync("/proc")
    .filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid)
    .map((name) => ({ pid: Number(name), environment: environmentOf(name) }))
    .filter(({ environment }) => environment.includes(`${FOLDER_MARK}=${folder}`))
    .map(({ pid, environment }) => {
      const mark = environment.find((line) => line.startsWith(`${NAME_MARK}=`));
      return { pid, name: mark?.slice(NAME_MARK.length + 1) ?? "a process" };
    });
}

function send(pid, signal) {
  try {
    process.kill(pid, signal);
  } catch (error) {
    if (error.code !== "ESRCH") throw error;
  }
}

/**
 * Ends what a start that was killed left running on this folder, and waits until it is gone: the
 * kernel tells direct children only, and a database needs a moment to end.
 * @returns {Promise<string[]>} names of what was found
 */
export async function endLeftOvers(folder) {
  const found = processesStartedFrom(folder);
  const deadline = Date.now() + GRACE_MS;
  for (const { pid } of found) send(pid, "SIGTERM");
  let left = found;
  while (left.length > 0) {
    if (Date.now() > deadline) for (const { pid } of left) send(pid, "SIGKILL");
    await sleep(50);
    left = processesStartedFrom(folder);
  }
  return [...new Set(found.map(({ name }) => name))];
}
