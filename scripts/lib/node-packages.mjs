import { createHash } from "node:crypto";
import { existsSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { Failure, step } from "./report.mjs";

const LOWEST_NODE = [20, 19];

export function checkNodeVersion(version = process.versions.node) {
  const [major, minor] = version.split(".").map(Number);
  if (major > LOWEST_NODE[0] || (major === LOWEST_NODE[0] && minor >= LOWEST_NODE[1])) return;
  throw new Failure(
    `This is Node ${version}; Riverline needs ${LOWEST_NODE.join(".")} or newer.`,
    "Install Node 20 or newer and start again.",
    "Nothing was changed.",
  );
}

/** What node_modules was installed from. Native parts depend on the Node version. */
export function packagesStamp(lockText, nodeVersion = process.versions.node) {
  return createHash("sha256").update(`${nodeVersion}\n${lockText}`).digest("hex");
}

/** Runs `npm ci` when node_modules does not hold what the lock file asks for. */
export async function ensureNodePackages(root, children) {
  const stampFile = path.join(root, "node_modules", ".riverline-stamp");
  const stamp = packagesStamp(readFileSync(path.join(root, "package-lock.json"), "utf8"));
  if (existsSync(stampFile) && readFileSync(stampFile, "utf8") === stamp) return;
  await step("Installing npm packages from the lock file (about a minute)", async () => {
    rmSync(stampFile, { force: true });
    await children.run({
      name: "npm",
      command: "npm",
      args: ["ci", "--no-audit", "--no-fund", "--include=dev"],
      cwd: root,
      env: { NODE_ENV: "development" },
      explain: "Installing npm packages",
    });
    writeFileSync(stampFile, stamp);
  });
}
