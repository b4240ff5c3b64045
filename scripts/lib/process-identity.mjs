import { readFileSync } from "node:fs";

/**
 * When a process began, in clock ticks since the machine started, or undefined when it is gone.
 * A pid alone does not name a process: numbers are used again.
 */
export function startTicks(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    // The second field is the command in brackets and may hold spaces.
    const fields = stat.slice(stat.lastIndexOf(")") + 2).split(" ");
    if (fields[0] === "Z") return undefined;
    return Number(fields[19]);
  } catch (error) {
    if (error.code === "ENOENT" || error.code === "ESRCH") return undefined;
    throw error;
  }
}

export function bootId() {
  return readFileSync("/proc/sys/kernel/random/boot_id", "utf8").trim();
}

export function identify(pid) {
  return { pid, startTicks: startTicks(pid), bootId: bootId() };
}

export function isSameProcessAlive(identity) {
  if (!Number.isInteger(identity?.pid) || identity.bootId !== bootId()) return false;
  const ticks = startTicks(identity.pid);
  return ticks !== undefined && ticks === identity.startTicks;
}
