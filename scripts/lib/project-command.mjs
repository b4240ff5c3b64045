import { spawnSync } from "node:child_process";
import { loadEnvironment } from "./load-env.mjs";
import { projectScript } from "./project-script.mjs";
import { Failure } from "./report.mjs";
import { root } from "./root.mjs";

/** Runs a TypeScript command of the project on the installation, in this window. */
export function runProjectCommand(file, args = process.argv.slice(2)) {
  try {
    const { command, args: all } = projectScript(file, args);
    const env = loadEnvironment();
    const result = spawnSync(command, all, { cwd: root, env, stdio: "inherit" });
    process.exitCode = result.status ?? 1;
  } catch (error) {
    if (!(error instanceof Failure)) throw error;
    process.stderr.write(`${error.message}\n`);
    process.exitCode = 1;
  }
}
