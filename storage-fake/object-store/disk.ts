import { open, readFile, rename, rm } from "node:fs/promises";
import path from "node:path";

export function isMissing(error: unknown): boolean {
  return error instanceof Error && "code" in error && error.code === "ENOENT";
}

export async function removeIfThere(file: string): Promise<void> {
  await rm(file, { force: true });
}

/** Makes a rename or a new name in the folder outlive a power cut. */
export async function flushFolder(folder: string): Promise<void> {
  const handle = await open(folder, "r");
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** Writes JSON under a temporary name, flushes it, and only then gives it its real name. */
export async function writeJson(file: string, temporary: string, value: unknown): Promise<void> {
  const handle = await open(temporary, "wx");
  try {
    await handle.writeFile(JSON.stringify(value));
    await handle.sync();
  } finally {
    await handle.close();
  }
  await rename(temporary, file);
  await flushFolder(path.dirname(file));
}

/** The content of a JSON file of our own making, or undefined when there is none. */
export async function readJson<T>(file: string): Promise<T | undefined> {
  try {
    return JSON.parse(await readFile(file, "utf8")) as T;
  } catch (error) {
    if (isMissing(error)) return undefined;
    throw error;
  }
}
