import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";

/** Everything that goes into the web build. */
const SOURCES = [
  "app",
  "components",
  "lib",
  "db",
  "public",
  "proxy.ts",
  "instrumentation.ts",
  "next.config.mjs",
  "postcss.config.mjs",
  "tailwind.config.ts",
  "tsconfig.json",
  "package.json",
  "package-lock.json",
];

function filesOf(root, name) {
  const full = path.join(root, name);
  if (!existsSync(full)) return [];
  if (path.extname(name) !== "" && !name.includes("/")) return [name];
  return readdirSync(full, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(root, path.join(entry.parentPath, entry.name)));
}

/** Changes when a source of the build is edited, added, removed or renamed. */
export function sourceStamp(root) {
  const hash = createHash("sha256").update(process.versions.node);
  for (const file of SOURCES.flatMap((name) => filesOf(root, name)).sort()) {
    const content = readFileSync(path.join(root, file));
    hash.update(`\0${file}\0${content.length}\0`).update(content);
  }
  return hash.digest("hex");
}

const stampFile = (buildFolder) => path.join(buildFolder, "riverline-stamp");

export function isBuilt(buildFolder, stamp) {
  const complete = existsSync(path.join(buildFolder, "BUILD_ID"));
  const file = stampFile(buildFolder);
  return complete && existsSync(file) && readFileSync(file, "utf8") === stamp;
}

export function forgetBuild(buildFolder) {
  rmSync(stampFile(buildFolder), { force: true });
}

export function rememberBuild(buildFolder, stamp) {
  writeFileSync(stampFile(buildFolder), stamp);
}
