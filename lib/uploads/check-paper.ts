import "server-only";
import { open, stat } from "node:fs/promises";
import { IMAGE_MEDIA_TYPES } from "@/lib/images/constants";
import { readPicture } from "@/lib/images/read-picture";
import { decodeWhole } from "@/lib/images/tile-pyramid";
import { FileRefusal } from "./file-refusal";
import type { FileMediaType } from "./file-rules";

/** A PDF ends with %%EOF; readers look for it in the last kilobyte (ISO 32000-1, annex H, note 18). */
const END_BYTES = 1024;

async function hasPdfEnd(file: string): Promise<boolean> {
  const { size } = await stat(file);
  const handle = await open(file);
  try {
    const length = Math.min(END_BYTES, size);
    const { buffer } = await handle.read(Buffer.alloc(length), 0, length, size - length);
    return buffer.includes("%%EOF");
  } finally {
    await handle.close();
  }
}

/**
 * Whether a photograph or paper of a field return is whole, and no larger than a picture may be.
 * @throws FileRefusal
 */
export async function checkPaper(
  file: string,
  fileName: string,
  mediaType: FileMediaType,
): Promise<void> {
  const cutShort = (cause?: unknown) =>
    new FileRefusal(
      `${fileName} is damaged or ends too early. It was not kept. Copy it again from its source and send it again.`,
      { cause },
    );
  if (!IMAGE_MEDIA_TYPES.some((type) => type === mediaType)) {
    if (!(await hasPdfEnd(file))) throw cutShort();
    return;
  }
  const head = await readPicture(file, fileName);
  await decodeWhole(file, head).catch((cause: unknown) => {
    throw cutShort(cause);
  });
}
