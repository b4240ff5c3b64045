import { linkSync, readFileSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { identify, isSameProcessAlive } from "./process-identity.mjs";
import { Failure } from "./report.mjs";

function read(file) {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch (error) {
    if (error.code === "ENOENT") return undefined;
    // An unreadable lock was cut short by a crash or a full disk: nobody holds it.
    if (error instanceof SyntaxError) return {};
    throw error;
  }
}

/** The process that holds the lock, or undefined when nobody living does. */
export function lockHolder(file) {
  const lock = read(file);
  return lock && isSameProcessAlive(lock) ? lock : undefined;
}

/**
 * Takes the lock for this process. A lock whose process is gone is taken over.
 * @returns {{ tookOver: boolean, release: () => void }}
 * @throws Failure when a living process holds it.
 */
export function takeLock(file, { busy }) {
  const own = `${file}.${process.pid}`;
  const content = { ...identify(process.pid), since: new Date().toISOString() };
  writeFileSync(own, JSON.stringify(content), { mode: 0o600 });
  let tookOver = false;
  try {
    // A hard link appears whole and only once, so two starts at the same moment cannot both win.
    for (let attempt = 0; attempt < 20; attempt += 1) {
      try {
        linkSync(own, file);
        return { tookOver, release: () => releaseLock(file) };
      } catch (error) {
        if (error.code !== "EEXIST") throw error;
      }
      const holder = lockHolder(file);
      if (holder) throw busy(holder);
      tookOver = moveStaleLockAway(file, `${own}.stale`) || tookOver;
    }
  } finally {
    rmSync(own, { force: true });
  }
  throw new Failure(`The lock ${file} could not be taken.`, "Start again in a moment.");
}

function moveStaleLockAway(file, aside) {
  try {
    renameSync(file, aside);
  } catch (error) {
    if (error.code === "ENOENT") return false;
    throw error;
  }
  // Between reading and moving, another start may have taken the lock over: give it back.
  if (lockHolder(aside)) {
    linkSync(aside, file);
    rmSync(aside);
    return false;
  }
  rmSync(aside);
  return true;
}

function releaseLock(file) {
  const lock = read(file);
  if (lock?.pid === process.pid) rmSync(file, { force: true });
}
