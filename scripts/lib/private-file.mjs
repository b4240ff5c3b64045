import { readFileSync, renameSync, writeFileSync } from "node:fs";

/** A small JSON file that only its owner may read; replaced whole, so that a crash cannot cut it. */
export function writePrivateJson(file, value) {
  const next = `${file}.next`;
  writeFileSync(next, `${JSON.stringify(value, null, 2)}\n`, { mode: 0o600 });
  renameSync(next, file);
}

export function readPrivateJson(file) {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch (error) {
    if (error.code === "ENOENT") return undefined;
    throw error;
  }
}
