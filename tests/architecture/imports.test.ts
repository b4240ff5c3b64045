import { describe, expect, it } from "vitest";
import { importsOf, type ProjectFile, sourceFiles, targetOf } from "./project-files";

const SCIENCES = [
  "units",
  "numerics",
  "hardness",
  "metallography",
  "fracture",
  "strength/reconcile",
  "imaging",
];

const isScience = (target: string) =>
  SCIENCES.some((science) => target === `lib/${science}` || target.startsWith(`lib/${science}/`));
const isServerOnly = (file: ProjectFile) => file.text.startsWith('import "server-only";');
const lib = sourceFiles("lib");
const serverOnly = new Set(
  lib.filter(isServerOnly).map((file) => file.path.replace(/\.tsx?$/, "")),
);

type Rule = {
  what: string;
  files: ProjectFile[];
  refuses: (target: string, from: string) => string | null;
};

const RULES: Rule[] = [
  {
    what: "a science imports sciences only: no framework, clock, database or node",
    files: lib.filter((file) => isScience(file.path)),
    refuses: (target) =>
      isScience(target) || target.startsWith("@stdlib/")
        ? null
        : "pass what it needs as an argument",
  },
  {
    what: "shared vocabulary stays safe for the browser",
    files: lib.filter(
      (file) => !isServerOnly(file) && !isScience(file.path) && file.path !== "lib/env.ts",
    ),
    refuses: (target) =>
      serverOnly.has(target) || /^(db|app|components)\//.test(target) || target.startsWith("node:")
        ? 'begin the file with import "server-only", or move what is shared to constants or schemas'
        : null,
  },
  {
    what: "verbs and reads know neither React nor Next",
    files: lib.filter(
      (file) => isServerOnly(file) && !/^lib\/(http|auth\/(session|options))/.test(file.path),
    ),
    refuses: (target) =>
      /^(react|react-dom|next|next\/.*|next-auth.*)$/.test(target) ||
      /^(app|components)\//.test(target)
        ? "only lib/http and lib/auth/session may"
        : null,
  },
  {
    what: "components know no server",
    files: sourceFiles("components"),
    refuses: (target) =>
      serverOnly.has(target) || /^(db|app)\//.test(target) || target === "drizzle-orm"
        ? "pass plain data as props"
        : null,
  },
  {
    what: "pages, actions and routes reach the database through verbs and reads",
    files: sourceFiles("app"),
    refuses: (target) =>
      target.startsWith("db/") || target.startsWith("drizzle-orm") || target === "mysql2"
        ? "write a read in lib/<noun>"
        : null,
  },
  {
    what: "the schema knows only constants and types of lib",
    files: sourceFiles("db/schema"),
    refuses: (target) =>
      target.startsWith("lib/") && !target.endsWith("/constants")
        ? "schema files import lib/*/constants only"
        : null,
  },
  {
    what: "nothing imports tests",
    files: sourceFiles("lib", "db", "components", "app", "storage-fake", "scripts"),
    refuses: (target) => (target.startsWith("tests/") ? "move it out of tests" : null),
  },
  {
    what: "the stand-ins know nothing of the portal",
    files: sourceFiles("storage-fake"),
    refuses: (target) =>
      /^(lib|db|app|components)\//.test(target) ? "they imitate the outside world" : null,
  },
];

describe("who may import whom", () => {
  it.each(RULES)("$what", ({ files, refuses }) => {
    const faults = files.flatMap((file) =>
      importsOf(file.text)
        .filter((found) => !found.isTypeOnly)
        .flatMap(({ module }) => {
          const target = targetOf(file.path, module);
          const instead = refuses(target, file.path);
          return instead === null ? [] : [`${file.path} imports ${module}: ${instead}`];
        }),
    );
    expect(faults).toEqual([]);
  });

  it("finds the files it speaks of", () => {
    expect(RULES.every((rule) => rule.files.length > 0)).toBe(true);
  });

  it("a client file never reaches the database, not even through another file", () => {
    const all = new Map(
      sourceFiles("lib", "components", "app", "db").map((file) => [
        file.path.replace(/\.tsx?$/, ""),
        file,
      ]),
    );
    const faults: string[] = [];
    for (const file of all.values()) {
      if (!/^"use client";/m.test(file.text.slice(0, 200))) continue;
      const seen = new Set<string>();
      const walk = (path: string, text: string, trail: string[]) => {
        for (const { module, isTypeOnly } of importsOf(text)) {
          const target = targetOf(path, module);
          const next = all.get(target) ?? all.get(`${target}/index`);
          if (isTypeOnly || !next || seen.has(target)) continue;
          seen.add(target);
          // The framework cuts at "use server": only a reference reaches the browser.
          if (next.text.startsWith('"use server";')) continue;
          if (target.startsWith("db/") || serverOnly.has(target))
            faults.push([...trail, target].join(" > "));
          else walk(next.path, next.text, [...trail, target]);
        }
      };
      walk(file.path, file.text, [file.path]);
    }
    expect(faults).toEqual([]);
  });
});
