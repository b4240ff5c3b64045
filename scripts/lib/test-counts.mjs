import { readFileSync, rmSync } from "node:fs";

/** Passed and failed of all stages of a test run. */
export class TestCounts {
  stages = [];

  add(name, passed, failed) {
    this.stages.push({ name, passed, failed });
  }

  get passed() {
    return this.stages.reduce((sum, stage) => sum + stage.passed, 0);
  }

  get failed() {
    return this.stages.reduce((sum, stage) => sum + stage.failed, 0);
  }

  get lastLine() {
    return `${this.passed} passed, ${this.failed} failed`;
  }
}

/**
 * What a run of the test runner came to. A runner that ended badly without naming a failed test
 * (it crashed, or found no tests) counts as one failure.
 * @param file written by tests/helpers/count-reporter.ts, removed after reading
 */
export function readRunCounts(file, exitCode) {
  let counts;
  try {
    counts = JSON.parse(readFileSync(file, "utf8"));
    rmSync(file);
  } catch (error) {
    if (error.code !== "ENOENT" && !(error instanceof SyntaxError)) throw error;
    return { passed: 0, failed: 1 };
  }
  const { passed } = counts;
  const failed = exitCode !== 0 && counts.failed === 0 ? 1 : counts.failed;
  return { passed, failed };
}
