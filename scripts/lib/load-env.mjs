import path from "node:path";
import { lockHolder } from "./lock-file.mjs";
import { readPrivateJson } from "./private-file.mjs";
import { Failure } from "./report.mjs";
import { root } from "./root.mjs";
import { givenSettings } from "./settings.mjs";
import { stateFolderFor } from "./state-folder.mjs";

/**
 * The environment for a command that works on the installation: the given one when DATABASE_URL is
 * set, else that of the Riverline which runs on this machine's state folder.
 * @throws Failure when none is given and none runs
 */
export function loadEnvironment() {
  const given = givenSettings(root);
  if (given.DATABASE_URL) return given;
  const chosen = given.RIVERLINE_STATE;
  const folder = stateFolderFor({ root, isRoot: process.getuid() === 0, chosen });
  const running = lockHolder(path.join(folder, "lock"));
  const kept = readPrivateJson(path.join(folder, "environment.json"));
  if (running && kept) return { ...process.env, ...kept };
  throw new Failure(
    `No Riverline is running on ${folder}, and DATABASE_URL is not set.`,
    "Start it with npm start in another window, or set RIVERLINE_STATE to the folder of the one " +
      "that runs, or set DATABASE_URL.",
  );
}
