import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { dataPath } from "./read-checks";

const root = fileURLToPath(new URL("../../", import.meta.url));
let folder = "";

function run(...files: string[]) {
  const command = path.join(root, "node_modules/.bin/tsx");
  const script = path.join(root, "scripts/check-values.ts");
  const { status, stdout, stderr } = spawnSync(command, [script, ...files], {
    cwd: root,
    encoding: "utf8",
  });
  return { status, lines: stdout.trim().split("\n"), stderr };
}

function file(name: string, text: string): string {
  const target = path.join(folder, name);
  writeFileSync(target, text);
  return target;
}

beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), "check-values-"));
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});

describe("the check-values command", () => {
  it("ends with the count and leaves with 0 when nothing failed", () => {
    const { status, lines } = run(dataPath("hardness_conversion_checks.csv"));
    expect(lines).toEqual(["143 passed, 0 failed, 0 unsupported"]);
    expect(status).toBe(0);
  });

  it("prints each row that fails or is not supported, and leaves with 1", () => {
    const form = "id,priority,quantity,inputs,expected,unit,tol,tol_kind\n";
    const rows = [
      'a,A,mean,"{""x"": [1, 2, 3]}",2,HV,0.001,abs',
      'b,A,mean,"{""x"": [1, 2, 3]}",3,HV,0.001,abs',
      'c,A,moon_phase,"{}",1,1,0,abs',
      'd,A,mean,"{""y"": [1]}",1,1,0,abs',
      "e,A,mean,not json,1,1,0,abs",
      'f,A,mean,"{""x"": [100]}",101,HV,0.02,rel',
    ];
    const { status, lines } = run(file("mixed.csv", form + rows.join("\r\n")));
    expect(lines[lines.length - 1]).toBe("2 passed, 1 failed, 3 unsupported");
    expect(lines[0]).toBe("b failed: expected 3, got 2, tolerance 0.001 abs");
    expect(lines[1]).toBe('c unsupported: no calculation named "moon_phase"');
    expect(status).toBe(1);
  });

  it.each([
    ["a file that is not there", () => path.join(folder, "none.csv")],
    ["another header", () => file("other.csv", "name,value\na,1\n")],
    ["a short row", () => file("short.csv", "id,quantity,inputs,expected,tol,tol_kind\na,b\n")],
    ["an open quote", () => file("quote.csv", 'id,quantity\n"a,b\n')],
    ["an empty file", () => file("empty.csv", "")],
  ])("says why it did not check %s, and leaves with 2", (_what, makeFile) => {
    const { status, stderr } = run(makeFile());
    expect(stderr).toContain("was not checked.");
    expect(status).toBe(2);
  });
});
