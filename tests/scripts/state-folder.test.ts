import { chmodSync, mkdtempSync, readFileSync, rmSync, statSync } from "node:fs";
import net from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { choosePort, isPortFree, readPort } from "../../scripts/lib/ports.mjs";
import { localPorts, localSecrets } from "../../scripts/lib/secrets.mjs";
import {
  checkDiskSpace,
  prepareStateFolder,
  stateFolderFor,
} from "../../scripts/lib/state-folder.mjs";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "state-"));
});
afterEach(() => rmSync(folder, { recursive: true }));

const mode = (file: string) => (statSync(file).mode & 0o777).toString(8);

async function occupied<T>(work: (port: number) => Promise<T>): Promise<T> {
  const server = net.createServer().listen(0, "127.0.0.1");
  await new Promise((resolve) => server.once("listening", resolve));
  try {
    return await work((server.address() as net.AddressInfo).port);
  } finally {
    server.close();
  }
}

describe("the state folder", () => {
  it("is the one named, else in the checkout, else for root under /var/lib", () => {
    const chosen = stateFolderFor({ root: folder, isRoot: true, chosen: "/srv/riverline" });
    expect(chosen).toBe("/srv/riverline");
    const own = stateFolderFor({ root: folder, isRoot: false, chosen: undefined });
    expect(own).toBe(path.join(folder, ".riverline"));
    const ofRoot = stateFolderFor({ root: folder, isRoot: true, chosen: undefined });
    expect(ofRoot).toMatch(/^\/var\/lib\/riverline\/[0-9a-f]{12}$/);
  });

  it("is closed to others, also when it was open before", () => {
    const state = path.join(folder, "deep", "state");
    prepareStateFolder(state);
    expect(mode(state)).toBe("700");
    chmodSync(state, 0o755);
    prepareStateFolder(state);
    expect(mode(state)).toBe("700");
  });

  it("keeps its secrets between starts, readable by their owner only", () => {
    const first = localSecrets(folder);
    expect(localSecrets(folder)).toEqual(first);
    expect(mode(path.join(folder, "secrets.json"))).toBe("600");
    expect(first.nextAuthSecret.length).toBeGreaterThanOrEqual(32);
    expect(new Set(Object.values(first)).size).toBe(4);
  });

  it("needs space, and says where and how much", () => {
    expect(() => checkDiskSpace([{ folder, neededMb: 1 }])).not.toThrow();
    expect(() => checkDiskSpace([{ folder, neededMb: 1e12 }])).toThrow(
      /has \d+ MB free; 1000000000000 MB are needed/,
    );
  });
});

describe("ports", () => {
  it("of local services stay the same, and give way only to another program", async () => {
    const first = await localPorts(folder, 3000);
    expect(await localPorts(folder, 3000)).toEqual(first);
    expect(new Set(Object.values(first)).size).toBe(4);
    const moved = await occupied((port) => choosePort(port));
    expect(moved).not.toBe(undefined);
    expect(JSON.parse(readFileSync(path.join(folder, "ports.json"), "utf8"))).toEqual(first);
  });

  it("that are used are seen", async () => {
    expect(await occupied((port) => isPortFree(port))).toBe(false);
    await occupied(async (port) => expect(await choosePort(port)).not.toBe(port));
  });

  it("of the portal are read from PORT, 3000 without one", () => {
    expect([readPort(undefined), readPort(""), readPort("8080")]).toEqual([3000, 3000, 8080]);
    for (const text of ["0", "70000", "80a", "-1", "3000.5"]) {
      expect(() => readPort(text)).toThrow(`PORT is set to "${text}"`);
    }
  });
});
