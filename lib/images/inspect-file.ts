import "server-only";
import { open } from "node:fs/promises";
import { fileTypeFromFile } from "file-type";
import type { UploadPurpose } from "@/lib/uploads/constants";
import {
  FILE_RULES,
  FILE_TYPE_NAMES,
  type FileMediaType,
  promisedType,
} from "@/lib/uploads/file-rules";
import { FileRefusal } from "@/lib/uploads/file-refusal";

const LOOKED_AT_BYTES = 1024;

/**
 * What a file without a known signature looks like, for the words of a refusal.
 * @throws FileRefusal for a TIFF that is cut short
 */
async function describeUnknown(file: string, fileName: string): Promise<string> {
  const handle = await open(file);
  try {
    const { buffer, bytesRead } = await handle.read(
      Buffer.alloc(LOOKED_AT_BYTES),
      0,
      LOOKED_AT_BYTES,
      0,
    );
    const start = buffer.subarray(0, bytesRead).toString("utf8").toLowerCase();
    if (bytesRead === 0) return "empty";
    // Its directory often stands last, and without it a TIFF is not known as one.
    if (/^(II\*\0|MM\0\*)/.test(buffer.toString("latin1", 0, 4))) {
      throw new FileRefusal(
        `${fileName} is damaged or ends too early. It was not kept. Copy it again from its source and send it again.`,
      );
    }
    if (start.includes("<svg")) return "an SVG drawing";
    if (start.includes("<!doctype html") || start.includes("<html")) return "a web page";
    return "not a file of a known type";
  } finally {
    await handle.close();
  }
}

/**
 * Real type of a file, from its first bytes.
 * @throws FileRefusal when it is none that this purpose takes, or not the one its name promises
 */
export async function inspectFile(
  file: string,
  fileName: string,
  purpose: UploadPurpose,
): Promise<FileMediaType> {
  const rule = FILE_RULES[purpose];
  const found = await fileTypeFromFile(file);
  const type = rule.mediaTypes.find((known) => known === found?.mime);
  if (!type) {
    const named = found && found.ext !== "xml" ? `a file of type ${found.ext.toUpperCase()}` : null;
    throw new FileRefusal(
      `${fileName} is ${named ?? (await describeUnknown(file, fileName))}, not a ${rule.says}. It was not kept. Save it as one of these and send it again.`,
    );
  }
  const promised = promisedType(fileName);
  if (promised !== type) {
    throw new FileRefusal(
      `${fileName} holds a ${FILE_TYPE_NAMES[type]} under another type's name. It was not kept. Give it the ending that fits and send it again.`,
    );
  }
  return type;
}
