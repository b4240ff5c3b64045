import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { checkNodeVersion, packagesStamp } from "../../scripts/lib/node-packages.mjs";
import {
  forgetBuild,
  isBuilt,
  rememberBuild,
  sourceStamp,
} from "../../scripts/lib/source-stamp.mjs";

let root: string;
beforeEach(() => {
  root = mkdtempSync(path.join(tmpdir(), "stamp-"));
  mkdirSync(path.join(root, "app", "cases"), { recursive: true });
  writeFileSync(path.join(root, "app", "cases", "page.tsx"), "one");
  writeFileSync(path.join(root, "package-lock.json"), "{}");
});
afterEach(() => rmSync(root, { recursive: true }));

describe("the stamp of a build", () => {
  it("changes when a source is edited, added, renamed or removed, and only then", () => {
    const first = sourceStamp(root);
    expect(sourceStamp(root)).toBe(first);
    const page = path.join(root, "app", "cases", "page.tsx");
    writeFileSync(page, "two");
    const edited = sourceStamp(root);
    writeFileSync(path.join(root, "proxy.ts"), "");
    const added = sourceStamp(root);
    renameSync(page, path.join(root, "app", "page.tsx"));
    const renamed = sourceStamp(root);
    rmSync(path.join(root, "app"), { recursive: true });
    const stamps = [first, edited, added, renamed, sourceStamp(root)];
    expect(new Set(stamps).size).toBe(stamps.length);
    writeFileSync(path.join(root, "README.md"), "not part of the build");
    expect(sourceStamp(root)).toBe(stamps.at(-1));
  });

  it("holds only for a build that was finished", () => {
    const build = path.join(root, ".next");
    expect(isBuilt(build, "a")).toBe(false);
    mkdirSync(build);
    rememberBuild(build, "a");
    expect(isBuilt(build, "a")).toBe(false);
    writeFileSync(path.join(build, "BUILD_ID"), "x");
    expect([isBuilt(build, "a"), isBuilt(build, "b")]).toEqual([true, false]);
    forgetBuild(build);
    expect(isBuilt(build, "a")).toBe(false);
  });
});

describe("the stamp of the npm packages", () => {
  it("depends on the lock file and on the Node version", () => {
    const stamps = [
      packagesStamp("{}", "20.19.0"),
      packagesStamp("{} ", "20.19.0"),
      packagesStamp("{}", "22.1.0"),
    ];
    expect(new Set(stamps).size).toBe(3);
  });
});

describe("the Node version", () => {
  it.each(["20.19.0", "20.20.2", "22.0.0", "24.1.0"])("%s will do", (version) => {
    expect(() => checkNodeVersion(version)).not.toThrow();
  });
  it.each(["18.20.1", "20.18.9", "20.9.0"])("%s is too old, and the message says so", (version) => {
    expect(() => checkNodeVersion(version)).toThrow(/needs 20\.19 or newer/);
  });
});
