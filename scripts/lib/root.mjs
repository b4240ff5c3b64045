import path from "node:path";
import { fileURLToPath } from "node:url";

/** The checkout that this script belongs to, whatever the current folder is. */
export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), "../..");
