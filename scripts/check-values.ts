import { readFileSync } from "node:fs";
import { checkFile } from "./check-values/check-file";
import type { RowResult } from "./check-values/check-row";

/**
 * Runs a file of published values through the portal's own calculations:
 * `npm run -s check-values -- FILE.csv`. Prints each row that fails or is not supported, and the
 * count. Exit 0 when none failed, 1 when one did, 2 when the file cannot be read.
 */
function checkPath(path: string): readonly RowResult[] | null {
  try {
    return checkFile(readFileSync(path, "utf8"));
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    console.error(`${path} was not checked. ${why}`);
    return null;
  }
}

function main(paths: readonly string[]): number {
  const [path, ...others] = paths;
  if (path === undefined || others.length > 0) {
    console.error("Name one file: npm run -s check-values -- FILE.csv");
    return 2;
  }
  const results = checkPath(path);
  if (!results) return 2;
  for (const result of results)
    if (result.status !== "passed") console.log(`${result.id} ${result.status}: ${result.reason}`);
  const count = (status: RowResult["status"]) =>
    results.filter((result) => result.status === status).length;
  console.log(
    `${count("passed")} passed, ${count("failed")} failed, ${count("unsupported")} unsupported`,
  );
  return count("failed") > 0 ? 1 : 0;
}

process.exitCode = main(process.argv.slice(2));
