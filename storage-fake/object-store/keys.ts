import { createHash, randomUUID } from "node:crypto";
import path from "node:path";

const BUCKET_NAME = /^(?!.*\.\.)[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/;

export function isBucketName(name: string): boolean {
  return BUCKET_NAME.test(name);
}

/**
 * Where one key lies: a folder by the first two digits of its SHA-256, a sidecar named by the whole
 * hash, and data files named `<hash>.<uuid>`. No character of a key ever becomes part of a path.
 */
export interface KeyPlace {
  folder: string;
  sidecar: string;
  newDataName(): string;
}

export function keyPlace(objectsFolder: string, key: string): KeyPlace {
  const hash = createHash("sha256").update(key).digest("hex");
  const folder = path.join(objectsFolder, hash.slice(0, 2));
  return {
    folder,
    sidecar: path.join(folder, `${hash}.json`),
    newDataName: () => `${hash}.${randomUUID()}`,
  };
}

/** Hash part of a file name in an objects folder. */
export function hashOfFileName(name: string): string {
  return name.slice(0, name.indexOf("."));
}

/** UTF-8 byte order, the order of S3 listings. */
export function compareKeys(a: string, b: string): number {
  return Buffer.compare(Buffer.from(a), Buffer.from(b));
}
