import { setTimeout as sleep } from "node:timers/promises";
import { Failure } from "../lib/report.mjs";
import { root } from "../lib/root.mjs";
import { tail } from "../lib/children.mjs";
import { ask } from "./http-client.mjs";

export const NEXT = "node_modules/next/dist/bin/next";
const LOOK_EVERY_MS = 20;
const PATIENCE_MS = 15 * 60_000;

async function answersWell(address) {
  try {
    return (await ask(address)).status === 200;
  } catch {
    // Nothing listens there yet; the caller's patience and the end of the process bound the wait.
    return false;
  }
}

/**
 * Starts a process and waits until `address` answers 200.
 * @returns the process and how long that took in ms
 */
export async function startUntilReady(children, { address, ...options }) {
  const begun = performance.now();
  const entry = children.start({ cwd: root, ...options });
  while (!(await answersWell(address))) {
    if (entry.exit || performance.now() - begun > PATIENCE_MS) {
      throw new Failure(
        `${options.name} did not answer at ${address}.\n${tail(entry.logFile)}`,
        `Its log is ${entry.logFile}.`,
      );
    }
    await sleep(LOOK_EVERY_MS);
  }
  return { entry, tookMs: performance.now() - begun };
}

/** `next start` and nothing around it. */
export function nextStart({ name, port, env, folder = "." }) {
  return {
    name,
    command: process.execPath,
    args: [NEXT, "start", folder, "-H", "127.0.0.1", "-p", String(port)],
    env: { NEXT_TELEMETRY_DISABLED: "1", ...env },
  };
}
