import { writeFileSync } from "node:fs";
import type { Reporter, TestModule } from "vitest/node";

/**
 * Writes how many tests passed and failed to the file named by TEST_COUNTS_FILE, so that
 * `npm test` can add the runs up. A file that does not load, a suite whose set-up fails, an error
 * outside every test and a test that never finished count as failed.
 */
export default class CountReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], unhandledErrors: readonly unknown[]) {
    const file = process.env.TEST_COUNTS_FILE;
    if (!file) return;
    const counts = { passed: 0, failed: unhandledErrors.length, skipped: 0 };
    for (const testModule of modules) {
      counts.failed += testModule.errors().length;
      for (const suite of testModule.children.allSuites()) counts.failed += suite.errors().length;
      for (const test of testModule.children.allTests()) {
        const { state } = test.result();
        if (state === "passed") counts.passed += 1;
        else if (state === "skipped") counts.skipped += 1;
        else counts.failed += 1;
      }
    }
    writeFileSync(file, JSON.stringify(counts));
  }
}
