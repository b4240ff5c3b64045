import path from "node:path";
import { describe, expect, it } from "vitest";
import { ACTIONS } from "@/lib/auth/policy";
import { sourceFiles } from "./project-files";

const app = sourceFiles("app");
const pages = app.filter((file) => path.basename(file.path) === "page.tsx");
const routeFiles = app.filter((file) => path.basename(file.path) === "route.ts");
const actionFiles = app.filter((file) => file.text.startsWith('"use server";'));
const known = new Set<string>(ACTIONS);

/** Pages and layouts outside (public) that need no sign-in would be a hole; these are the open ones. */
const OPEN_PAGES = /^app\/\(public\)\//;
const OPEN_ROUTES = new Set(["app/api/auth/[...nextauth]/route.ts", "app/api/health/route.ts"]);

describe("every page, route and action declares its permission", () => {
  it.each(pages.map((file) => [file.path, file]))("%s", (_path, file) => {
    const asked = [...file.text.matchAll(/pageActor\("([^"]+)"\)/g)].map((match) => match[1] ?? "");
    const isOpen = /\bopenPage\(\)/.test(file.text);
    expect(asked.length > 0 || isOpen, 'call pageActor("…") or openPage()').toBe(true);
    expect(isOpen && !OPEN_PAGES.test(file.path), "only pages under (public) are open").toBe(false);
    expect(asked.filter((action) => !known.has(action))).toEqual([]);
  });

  it.each(routeFiles.map((file) => [file.path, file]))("%s", (_path, file) => {
    const methods = [
      ...file.text.matchAll(
        /export (?:const|async function|function) (GET|POST|PUT|PATCH|DELETE|HEAD)\b/g,
      ),
    ];
    const isOpen = OPEN_ROUTES.has(file.path);
    const asked = [...file.text.matchAll(/permission: "([^"]+)"/g)].map((match) => match[1] ?? "");
    expect(asked.filter((action) => !known.has(action))).toEqual([]);
    if (isOpen) return;
    for (const method of methods) {
      expect(file.text, `${method[1]} is built by route()`).toMatch(
        new RegExp(`export const ${method[1]} = route(?:<[\\s\\S]*?>)?\\(\\s*\\{\\s*permission: "`),
      );
    }
    expect(methods.length).toBeGreaterThan(0);
    expect(file.text).not.toMatch(/\bopenRoute\(/);
  });

  it.each(actionFiles.map((file) => [file.path, file]))("%s", (_path, file) => {
    const asked = [...file.text.matchAll(/permission: "([^"]+)"/g)].map((match) => match[1] ?? "");
    expect(asked.filter((action) => !known.has(action))).toEqual([]);
    const exports = [
      ...file.text.matchAll(/^export (?:const|async function|function) (\w+)/gm),
    ].map((match) => match[1]);
    for (const name of exports) {
      // Signing out is plain, so that a form can call it; inside it asks an action of its own.
      if (name === "signOut") continue;
      const isBuilt = new RegExp(
        `export const ${name} = (?:action\\(\\s*\\{\\s*permission: "|openAction\\()`,
      ).test(file.text);
      expect(isBuilt, `${name} is built by action()`).toBe(true);
      if (file.text.includes(`export const ${name} = openAction(`))
        expect(file.path).toMatch(/^app\/\(public\)\//);
    }
  });

  it("finds pages, routes and actions", () => {
    expect(pages.length).toBeGreaterThan(10);
    expect(routeFiles.length).toBeGreaterThan(5);
    expect(actionFiles.length).toBeGreaterThan(5);
  });
});
