import { mkdir, rename } from "node:fs/promises";
import path from "node:path";
import type { Checksum } from "./checksum";
import { flushFolder, readJson, removeIfThere, writeJson } from "./disk";
import { noSuchKey } from "./errors";
import { keyPlace } from "./keys";
import type { Bucket, Store } from "./store";

/** Sidecar of one object. The data file beside it never changes once the sidecar names it. */
export interface StoredObject {
  key: string;
  dataName: string;
  size: number;
  /** Without quotes: MD5 in hex, or `MD5-N` of a multipart object. */
  etag: string;
  /** ISO 8601, UTC. */
  lastModified: string;
  /** Content headers and `x-amz-meta-` headers, given back as they came. */
  headers: Record<string, string>;
  checksum?: Checksum;
}

export type NewObject = Omit<StoredObject, "dataName" | "lastModified">;

export async function findObject(bucket: Bucket, key: string): Promise<StoredObject | undefined> {
  return readJson<StoredObject>(keyPlace(bucket.objectsFolder, key).sidecar);
}

/** @throws StoreError 404 */
export async function getObject(bucket: Bucket, key: string): Promise<StoredObject> {
  const object = await findObject(bucket, key);
  if (!object) throw noSuchKey(key);
  return object;
}

export function dataPath(bucket: Bucket, object: StoredObject): string {
  return path.join(keyPlace(bucket.objectsFolder, object.key).folder, object.dataName);
}

/**
 * Puts a finished file under its key. The renamed sidecar is the commit: before it the old object
 * stands whole, after it the new one.
 *
 * @param temporaryPath The flushed data file; it is moved away on success and removed on failure.
 * @param check Runs under the key's lock with the object that stands there; throws to refuse.
 */
export async function commitObject(
  store: Store,
  bucket: Bucket,
  draft: NewObject,
  temporaryPath: string,
  check: (current: StoredObject | undefined) => void,
): Promise<StoredObject> {
  return store.locks.run(`${bucket.name}/${draft.key}`, async () => {
    const place = keyPlace(bucket.objectsFolder, draft.key);
    const dataName = place.newDataName();
    const dataFile = path.join(place.folder, dataName);
    try {
      const current = await findObject(bucket, draft.key);
      check(current);
      const object = { ...draft, dataName, lastModified: new Date().toISOString() };
      const made = await mkdir(place.folder, { recursive: true });
      if (made !== undefined) await flushFolder(bucket.objectsFolder);
      await rename(temporaryPath, dataFile);
      await writeJson(place.sidecar, store.temporaryPath(), object);
      await bucket.index.set(object);
      if (current) await removeIfThere(path.join(place.folder, current.dataName));
      return object;
    } catch (error) {
      await removeIfThere(temporaryPath);
      // Whether the sidecar was renamed decides who owns the data file.
      const standing = await findObject(bucket, draft.key);
      if (standing?.dataName !== dataName) await removeIfThere(dataFile);
      throw error;
    }
  });
}

/** Deleting what is not there is no error, as in S3. */
export async function deleteObject(
  store: Store,
  bucket: Bucket,
  key: string,
  check: (current: StoredObject | undefined) => void,
): Promise<void> {
  await store.locks.run(`${bucket.name}/${key}`, async () => {
    const current = await findObject(bucket, key);
    check(current);
    if (!current) return;
    const place = keyPlace(bucket.objectsFolder, key);
    await removeIfThere(place.sidecar);
    await flushFolder(place.folder);
    await bucket.index.delete(key);
    await removeIfThere(path.join(place.folder, current.dataName));
  });
}
