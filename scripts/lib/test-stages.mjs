import { mkdirSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { formatDuration, sayBold, sayDetail } from "./report.mjs";
import { root } from "./root.mjs";
import { readRunCounts } from "./test-counts.mjs";

/** Kept apart from the product's own build, which may be serving while the tests run. */
export const TEST_BUILD = ".next-test";

const tool = (file, ...args) => ({ command: process.execPath, args: [file, ...args] });

export const checks = {
  format: () => tool("node_modules/prettier/bin/prettier.cjs", "--check", "."),
  lint: () => tool("node_modules/eslint/bin/eslint.js", "--max-warnings=0", "."),
  routeTypes: () => tool("node_modules/next/dist/bin/next", "typegen"),
  types: () => tool("node_modules/typescript/bin/tsc", "--noEmit", "-p", writeTypeCheckConfig()),
};

/** As tsconfig.json, but without the route types that an older build or dev server left behind. */
function writeTypeCheckConfig() {
  const file = path.join(root, TEST_BUILD, "tsconfig.json");
  mkdirSync(path.dirname(file), { recursive: true });
  const sources = ["../next-env.d.ts", "../**/*.ts", "../**/*.tsx", "../**/*.mts"];
  const config = {
    extends: "../tsconfig.json",
    compilerOptions: { incremental: false },
    include: [...sources, "./types/**/*.ts"],
    exclude: ["../node_modules", "../.next", "./dev"],
  };
  writeFileSync(file, JSON.stringify(config));
  return file;
}

/** Runs the parts of one check in turn; together they count as one test. */
export async function runCheck({ name, parts, children, counts, env = {} }) {
  sayBold(`\n== ${name}`);
  const begun = performance.now();
  let good = true;
  for (const part of parts) {
    const exit = await children.exitOf({
      name: name.replaceAll(" ", "-"),
      ...part(),
      cwd: root,
      env: { NEXT_TELEMETRY_DISABLED: "1", NEXT_DIST_DIR: TEST_BUILD, ...env },
      show: true,
    });
    good &&= exit.code === 0;
    if (!good) break;
  }
  counts.add(name, good ? 1 : 0, good ? 0 : 1);
  sayDetail(`${good ? "passed" : "FAILED"} after ${formatDuration(performance.now() - begun)}`);
  return good;
}

/** Runs projects of the test runner and adds its counts. */
export async function runTests({ name, projects, filters = [], env, children, counts }) {
  sayBold(`\n== ${name}`);
  const begun = performance.now();
  const countsFile = path.join(children.folder, `${name.replaceAll(" ", "-")}-counts.json`);
  rmSync(countsFile, { force: true });
  const exit = await children.exitOf({
    name: `tests-${name.replaceAll(" ", "-")}`,
    ...tool(
      "node_modules/vitest/vitest.mjs",
      "run",
      ...projects.flatMap((project) => ["--project", project]),
      "--reporter=default",
      "--reporter=./tests/helpers/count-reporter.ts",
      ...filters,
    ),
    cwd: root,
    env: { ...env, NODE_ENV: "test", TEST_COUNTS_FILE: countsFile },
    show: true,
  });
  const { passed, failed } = readRunCounts(countsFile, exit.code);
  counts.add(name, passed, failed);
  sayDetail(
    `${passed} passed, ${failed} failed after ${formatDuration(performance.now() - begun)}`,
  );
}
