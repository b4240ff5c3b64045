import { existsSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, describe, expect, it } from "vitest";
import { readRunCounts, TestCounts } from "../../scripts/lib/test-counts.mjs";

const folder = mkdtempSync(path.join(tmpdir(), "counts-"));
afterAll(() => rmSync(folder, { recursive: true }));

function countsOf(content: string | undefined, exitCode: number) {
  const file = path.join(folder, "counts.json");
  if (content !== undefined) writeFileSync(file, content);
  const counts = readRunCounts(file, exitCode);
  expect(content === undefined || !existsSync(file) || counts.failed > 0).toBe(true);
  return counts;
}

describe("the sum of a test run", () => {
  it("adds the stages up to one plain last line", () => {
    const counts = new TestCounts();
    expect(counts.lastLine).toBe("0 passed, 0 failed");
    counts.add("format", 1, 0);
    counts.add("tests", 120, 2);
    expect(counts.lastLine).toBe("121 passed, 2 failed");
  });

  it("takes over what the runner counted", () => {
    expect(countsOf('{"passed":5,"failed":0,"skipped":1}', 0)).toEqual({ passed: 5, failed: 0 });
    expect(countsOf('{"passed":5,"failed":3,"skipped":0}', 1)).toEqual({ passed: 5, failed: 3 });
  });

  it("counts a runner that crashed, or failed without naming a test, as one failure", () => {
    expect(countsOf(undefined, 0)).toEqual({ passed: 0, failed: 1 });
    expect(countsOf('{"passed":5,"failed":0,"skipped":0}', 1)).toEqual({ passed: 5, failed: 1 });
    expect(countsOf('{"passed":', 0)).toEqual({ passed: 0, failed: 1 });
  });
});
