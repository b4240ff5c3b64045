import { readdir, rm } from "node:fs/promises";
import path from "node:path";
import { readJson, removeIfThere } from "./disk";
import { hashOfFileName } from "./keys";

/** Removes upload folders whose making or removing was cut short. */
export async function sweepUploads(uploadsFolder: string): Promise<void> {
  for (const name of await readdir(uploadsFolder)) {
    const folder = path.join(uploadsFolder, name);
    if ((await readdir(folder)).includes("upload.json")) continue;
    await rm(folder, { recursive: true });
  }
}

/** Removes data files that no sidecar names: their writing or replacing was cut short. */
export async function sweepDataFiles(objectsFolder: string): Promise<void> {
  for (const shard of await readdir(objectsFolder)) {
    const folder = path.join(objectsFolder, shard);
    const names = await readdir(folder);
    const filesOfHash = new Map<string, string[]>();
    for (const name of names) {
      const hash = hashOfFileName(name);
      filesOfHash.set(hash, [...(filesOfHash.get(hash) ?? []), name]);
    }
    for (const [hash, files] of filesOfHash) {
      const sidecar = `${hash}.json`;
      if (files.length === 2 && files.includes(sidecar)) continue;
      const object = await readJson<{ dataName: string }>(path.join(folder, sidecar));
      const orphans = files.filter((name) => name !== sidecar && name !== object?.dataName);
      for (const orphan of orphans) await removeIfThere(path.join(folder, orphan));
    }
  }
}
