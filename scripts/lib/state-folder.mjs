import { createHash } from "node:crypto";
// As a whole: a Node too old for statfs must still get as far as the check of its version.
import fs from "node:fs";
import path from "node:path";
import { Failure } from "./report.mjs";

const MB = 1024 * 1024;
export const FIRST_START_MB = 1500;
export const LATER_START_MB = 300;

/** Where the local services keep their data. */
export function stateFolderFor({ root, isRoot, chosen }) {
  if (chosen) return path.resolve(chosen);
  if (!isRoot) return path.join(root, ".riverline");
  const hash = createHash("sha256").update(fs.realpathSync(root)).digest("hex").slice(0, 12);
  return path.join("/var/lib/riverline", hash);
}

/** Makes the folder private to its owner, and refuses one that belongs to somebody else. */
export function prepareStateFolder(folder) {
  try {
    fs.mkdirSync(folder, { recursive: true, mode: 0o755 });
    const stat = fs.statSync(folder);
    if (stat.uid !== process.getuid()) {
      throw new Failure(
        `The state folder ${folder} belongs to another user of this machine (user id ${stat.uid}).`,
        "Start Riverline as that user, or set RIVERLINE_STATE to a folder of your own.",
        "Nothing in it was changed.",
      );
    }
    // A folder that lets the database's group pass (mode 0710) is left so: it may be in use.
    if ((stat.mode & 0o067) !== 0) fs.chmodSync(folder, 0o700);
    fs.mkdirSync(path.join(folder, "logs"), { recursive: true, mode: 0o700 });
  } catch (error) {
    if (error instanceof Failure) throw error;
    throw new Failure(
      `The state folder ${folder} cannot be made or written: ${error.message}`,
      "Set RIVERLINE_STATE to a folder you may write to, on a disk with free space.",
    );
  }
}

/** Free space for this user in MB, on the disk that holds the folder or its nearest parent. */
export function freeMegabytes(folder) {
  let place = path.resolve(folder);
  while (!fs.existsSync(place)) place = path.dirname(place);
  const stat = fs.statfsSync(place);
  return Math.floor((stat.bavail * stat.bsize) / MB);
}

/** @param places pairs of folder and MB needed there */
export function checkDiskSpace(places) {
  for (const { folder, neededMb } of places) {
    const free = freeMegabytes(folder);
    if (free >= neededMb) continue;
    throw new Failure(
      `The disk that holds ${folder} has ${free} MB free; ${neededMb} MB are needed.`,
      "Free some space there, or set RIVERLINE_STATE to a folder on another disk, then start again.",
      "Nothing was changed.",
    );
  }
}

/** A sentence for the end of a failure when a disk has run full, else nothing. */
export function fullDiskHint(folders) {
  const full = folders.filter((folder) => freeMegabytes(folder) < 50);
  if (full.length === 0) return "";
  return `The disk that holds ${full[0]} is full; that is the likely cause. Free some space and start again.`;
}
