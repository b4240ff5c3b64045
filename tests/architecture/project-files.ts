import { readdirSync, readFileSync, statSync } from "node:fs";
import path from "node:path";

export const ROOT = path.resolve(import.meta.dirname, "../..");

export type ProjectFile = { path: string; text: string };

function* walk(folder: string): Generator<string> {
  for (const name of readdirSync(path.join(ROOT, folder))) {
    const relative = path.posix.join(folder, name);
    if (statSync(path.join(ROOT, relative)).isDirectory()) yield* walk(relative);
    else yield relative;
  }
}

/** Source files under the given folders, as paths from the root with their text. */
export function sourceFiles(...folders: string[]): ProjectFile[] {
  return folders
    .flatMap((folder) => [...walk(folder)])
    .filter((file) => /\.(ts|tsx)$/.test(file) && !file.endsWith(".d.ts"))
    .map((file) => ({ path: file, text: readFileSync(path.join(ROOT, file), "utf8") }));
}

/** Modules a file imports at run time, and those it imports for types only, as written. */
export function importsOf(text: string): { module: string; isTypeOnly: boolean }[] {
  const found: { module: string; isTypeOnly: boolean }[] = [];
  for (const match of text.matchAll(
    /^\s*(?:import|export)\s+(type\s+)?(?:([\s\S]*?)\s+from\s+)?"([^"]+)";/gm,
  )) {
    const names = match[2] ?? "";
    const allTypes =
      /^\{[\s\S]*\}$/.test(names.trim()) &&
      names
        .replace(/[{}]/g, "")
        .split(",")
        .map((n) => n.trim())
        .filter(Boolean)
        .every((n) => n.startsWith("type "));
    found.push({ module: match[3] ?? "", isTypeOnly: match[1] !== undefined || allTypes });
  }
  for (const match of text.matchAll(/\bimport\("([^"]+)"\)/g))
    found.push({ module: match[1] ?? "", isTypeOnly: false });
  return found;
}

/** Where an import leads, from the root, or the package name. */
export function targetOf(from: string, module: string): string {
  if (module.startsWith("@/")) return module.slice(2);
  if (module.startsWith("."))
    return path.posix.normalize(path.posix.join(path.posix.dirname(from), module));
  return module;
}
