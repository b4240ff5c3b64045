import { randomUUID } from "node:crypto";
import { mkdir, readdir, rm } from "node:fs/promises";
import path from "node:path";
import type { CorsRule } from "./cors";
import { flushFolder, readJson, removeIfThere, writeJson } from "./disk";
import { StoreError } from "./errors";
import { KeyIndex } from "./key-index";
import { KeyLocks } from "./key-locks";
import { isBucketName } from "./keys";
import { sweepDataFiles, sweepUploads } from "./sweep";

interface BucketFile {
  createdAt: string;
  cors: CorsRule[];
}

export interface Bucket extends BucketFile {
  name: string;
  objectsFolder: string;
  uploadsFolder: string;
  index: KeyIndex;
}

/** The folder of the store: `tmp/` for half-written files, `buckets/NAME/` for each bucket. */
export class Store {
  readonly locks = new KeyLocks();
  private readonly buckets = new Map<string, Bucket>();

  private constructor(private readonly folder: string) {}

  /** Opens or creates the folder and sweeps away what a crash left half-written. */
  static async open(folder: string): Promise<Store> {
    const store = new Store(folder);
    await rm(path.join(folder, "tmp"), { recursive: true, force: true });
    await mkdir(path.join(folder, "tmp"), { recursive: true });
    await mkdir(path.join(folder, "buckets"), { recursive: true });
    for (const name of await readdir(path.join(folder, "buckets"))) {
      const file = await readJson<BucketFile>(path.join(store.bucketFolder(name), "bucket.json"));
      if (!file) continue;
      const bucket = store.bucketOf(name, file);
      await sweepDataFiles(bucket.objectsFolder);
      await sweepUploads(bucket.uploadsFolder);
      store.buckets.set(name, bucket);
    }
    return store;
  }

  temporaryPath(): string {
    return path.join(this.folder, "tmp", randomUUID());
  }

  allBuckets(): Bucket[] {
    return [...this.buckets.values()].sort((a, b) => (a.name < b.name ? -1 : 1));
  }

  findBucket(name: string): Bucket | undefined {
    return this.buckets.get(name);
  }

  /** @throws StoreError 404 */
  bucket(name: string): Bucket {
    const bucket = this.findBucket(name);
    if (!bucket) {
      throw new StoreError(404, "NoSuchBucket", `There is no bucket named ${name}.`);
    }
    return bucket;
  }

  /** @throws StoreError 400 for a name that is not allowed, 409 when it exists. */
  async createBucket(name: string): Promise<void> {
    if (!isBucketName(name)) {
      throw new StoreError(
        400,
        "InvalidBucketName",
        "A bucket name has 3 to 63 lower-case letters, digits, dots and hyphens.",
      );
    }
    await this.locks.run(name, async () => {
      if (this.buckets.has(name)) {
        throw new StoreError(409, "BucketAlreadyOwnedByYou", `You already own the bucket ${name}.`);
      }
      const bucket = this.bucketOf(name, { createdAt: new Date().toISOString(), cors: [] });
      await mkdir(bucket.objectsFolder, { recursive: true });
      await mkdir(bucket.uploadsFolder, { recursive: true });
      await this.writeBucket(bucket);
      await flushFolder(path.join(this.folder, "buckets"));
      this.buckets.set(name, bucket);
    });
  }

  /** @throws StoreError 404, 409 when objects are left. */
  async deleteBucket(name: string): Promise<void> {
    await this.locks.run(name, async () => {
      const bucket = this.bucket(name);
      if ((await bucket.index.all()).length > 0) {
        throw new StoreError(409, "BucketNotEmpty", `The bucket ${name} still holds objects.`);
      }
      this.buckets.delete(name);
      // Without this file the folder is no bucket, should the rest be cut short.
      await removeIfThere(path.join(this.bucketFolder(name), "bucket.json"));
      await rm(this.bucketFolder(name), { recursive: true });
    });
  }

  async setCors(name: string, cors: CorsRule[]): Promise<void> {
    await this.locks.run(name, async () => {
      const bucket = this.bucket(name);
      await this.writeBucket({ ...bucket, cors });
      bucket.cors = cors;
    });
  }

  private bucketFolder(name: string): string {
    return path.join(this.folder, "buckets", name);
  }

  private bucketOf(name: string, file: BucketFile): Bucket {
    const objectsFolder = path.join(this.bucketFolder(name), "objects");
    const uploadsFolder = path.join(this.bucketFolder(name), "uploads");
    return { ...file, name, objectsFolder, uploadsFolder, index: new KeyIndex(objectsFolder) };
  }

  private async writeBucket({ name, createdAt, cors }: Bucket): Promise<void> {
    const file: BucketFile = { createdAt, cors };
    await writeJson(path.join(this.bucketFolder(name), "bucket.json"), this.temporaryPath(), file);
  }
}
