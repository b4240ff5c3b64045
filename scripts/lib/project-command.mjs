import { spawnSync } from "node:child_process";
import { loadEnvironment } from "./load-env.mjs";
import { projectScript } from "./project-script.mjs";
import { orExit } from "./report.mjs";
import { root } from "./root.mjs";

/** Runs a TypeScript command of the project on the installation, in this window. */
export function runProjectCommand(file, args = process.argv.slice(2)) {
  const env = orExit(loadEnvironment);
  const { command, args: all } = projectScript(file, args);
  process.exitCode = spawnSync(command, all, { cwd: root, env, stdio: "inherit" }).status ?? 1;
}
