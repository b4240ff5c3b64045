import { existsSync, readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { ROLES } from "@/lib/people/constants";
import { ROOT, sourceFiles } from "./project-files";

const lib = sourceFiles("lib");
const all = sourceFiles("lib", "components", "app", "db", "storage-fake", "scripts");

describe("conventions", () => {
  it("nobody writes a role name outside the policy", () => {
    const names = new RegExp(`["'\`](?:${ROLES.join("|")})["'\`]`);
    const allowed =
      /^(lib\/auth\/policy\.ts|lib\/people\/constants\.ts|db\/seed\/|scripts\/bench\/)/;
    const faults = all
      .filter((file) => !allowed.test(file.path))
      .flatMap((file) =>
        file.text
          .split("\n")
          // An object's key or a form field may share the word; a comparison or a list may not.
          .filter((line) => names.test(line) && /role|===|!==|includes\(/i.test(line))
          .map((line) => `${file.path}: ${line.trim()}`),
      );
    expect(faults).toEqual([]);
  });

  it("a verb that opens a transaction asks the policy and records an event", () => {
    const plumbing =
      /^lib\/(http|jobs|audit|auth|records|storage|outbox)\/|^lib\/cases\/(write-case|move-case|gate-count|subject)\.ts$|-job\.ts$/;
    const faults = lib
      .filter((file) => !plumbing.test(file.path))
      .filter(
        (file) =>
          /\b(transaction|writeCase)\(/.test(file.text) &&
          /\.(insert|update|delete)\(|createRecord\(|addVersion\(/.test(file.text),
      )
      .filter((file) => {
        const asks = /\b(requireAllowed|writeCase)\(/.test(file.text);
        const records = /\b(recordEvent|moveCase)\(/.test(file.text);
        return !(records && (asks || OPEN_VERBS.has(file.path)));
      })
      .map((file) => file.path);
    expect(faults).toEqual([]);
  });

  it("links are made by lib/routes.ts only", () => {
    const handTyped = /(?:href|push|replace|assign|redirect|fetch)\s*[=(]\s*\{?\s*["'`]\/[a-z]/;
    const faults = sourceFiles("app", "components")
      .flatMap((file) => file.text.split("\n").map((line) => ({ file: file.path, line })))
      .filter(({ line }) => handTyped.test(line))
      .map(({ file, line }) => `${file}: ${line.trim()}`);
    expect(faults).toEqual([]);
  });

  it("every hardness table names its source", () => {
    const tables = sourceFiles("lib/hardness/tables");
    expect(tables.length).toBe(12);
    for (const table of tables) {
      expect(table.text, table.path).toMatch(/edition:/);
      expect(table.text, table.path).toMatch(/source/i);
    }
  });

  it.each(["README.md", "DEVELOPERS.md"])("every path named in %s is there", (name) => {
    const text = readFileSync(path.join(ROOT, name), "utf8");
    const paths = [
      ...text.matchAll(
        /`((?:app|components|lib|db|drizzle|storage-fake|tests|scripts|\.ci)\/[^`\s*<…]+)`/g,
      ),
    ].map((match) => (match[1] ?? "").replace(/[,:;]$/, ""));
    expect(paths.length).toBeGreaterThan(0);
    expect(paths.filter((found) => !existsSync(path.join(ROOT, found)))).toEqual([]);
  });
});

/** Verbs for people who cannot be signed in yet, and for nobody. */
const OPEN_VERBS = new Set([
  // Riverline's own word on a file that cannot be taken; it was asked for when the file was sent.
  "lib/uploads/refuse-upload.ts",
  "lib/people/ask-for-reset.ts",
  "lib/people/set-password.ts",
  "lib/people/set-up.ts",
]);
