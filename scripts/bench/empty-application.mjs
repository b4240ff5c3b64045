import { cpSync, symlinkSync } from "node:fs";
import path from "node:path";
import { choosePort } from "../lib/ports.mjs";
import { root } from "../lib/root.mjs";
import { NEXT, nextStart, startUntilReady } from "./servers.mjs";

const env = { NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" };

/** Builds the framework's empty application in the throw-away folder. @returns where it lies */
export async function buildEmptyApplication(children, throwAway) {
  const folder = path.join(throwAway, "yardstick");
  cpSync(path.join(import.meta.dirname, "yardstick"), folder, { recursive: true });
  symlinkSync(path.join(root, "node_modules"), path.join(folder, "node_modules"));
  await children.run({
    name: "build-yardstick",
    command: process.execPath,
    args: [NEXT, "build", folder],
    cwd: root,
    env,
    explain: "Building the framework's empty application",
  });
  return folder;
}

/** @returns the process and the address at which it serves */
export async function startEmptyApplication(children, folder) {
  const port = await choosePort();
  const base = `http://127.0.0.1:${port}`;
  const { entry } = await startUntilReady(children, {
    ...nextStart({ name: "web-yardstick", port, env, folder }),
    address: base,
  });
  return { entry, base };
}
