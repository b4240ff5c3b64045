import { accessSync, constants } from "node:fs";
import path from "node:path";

// A normal user's PATH on Debian leaves the sbin folders out.
const ALSO = ["/usr/local/sbin", "/usr/sbin", "/sbin"];

/** Full path of a program, or undefined when this machine has none of that name. */
export function findCommand(name, searchPath = process.env.PATH ?? "") {
  for (const folder of [...searchPath.split(path.delimiter), ...ALSO]) {
    const file = path.join(folder, name);
    try {
      accessSync(file, constants.X_OK);
      return file;
    } catch (error) {
      if (!["ENOENT", "EACCES", "ENOTDIR"].includes(error.code)) throw error;
    }
  }
  return undefined;
}
