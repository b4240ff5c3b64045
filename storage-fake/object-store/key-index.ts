import { readdir } from "node:fs/promises";
import path from "node:path";
import { readJson } from "./disk";
import { compareKeys } from "./keys";
import type { StoredObject } from "./objects";

export interface IndexEntry {
  key: string;
  size: number;
  etag: string;
  lastModified: string;
}

function entryOf({ key, size, etag, lastModified }: StoredObject): IndexEntry {
  return { key, size, etag, lastModified };
}

/** The keys of one bucket for listings, read from the sidecars at the first listing. */
export class KeyIndex {
  private entries: Promise<Map<string, IndexEntry>> | null = null;
  private sorted: IndexEntry[] | null = null;

  constructor(private readonly objectsFolder: string) {}

  async set(object: StoredObject): Promise<void> {
    if (!this.entries) return;
    (await this.entries).set(object.key, entryOf(object));
    this.sorted = null;
  }

  async delete(key: string): Promise<void> {
    if (!this.entries) return;
    (await this.entries).delete(key);
    this.sorted = null;
  }

  /** All entries in UTF-8 byte order of their keys. */
  async all(): Promise<IndexEntry[]> {
    this.entries ??= this.load();
    const entries = await this.entries;
    this.sorted ??= [...entries.values()].sort((a, b) => compareKeys(a.key, b.key));
    return this.sorted;
  }

  private async load(): Promise<Map<string, IndexEntry>> {
    const entries = new Map<string, IndexEntry>();
    for (const shard of await readdir(this.objectsFolder)) {
      const folder = path.join(this.objectsFolder, shard);
      const sidecars = (await readdir(folder)).filter((name) => name.endsWith(".json"));
      const objects = await Promise.all(
        sidecars.map((name) => readJson<StoredObject>(path.join(folder, name))),
      );
      for (const object of objects) if (object) entries.set(object.key, entryOf(object));
    }
    return entries;
  }
}
