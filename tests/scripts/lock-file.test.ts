import { spawn } from "node:child_process";
import { once } from "node:events";
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { lockHolder, takeLock } from "../../scripts/lib/lock-file.mjs";
import { identify } from "../../scripts/lib/process-identity.mjs";

let folder: string;
let file: string;
const busy = ({ pid }: { pid: number }) => new Error(`held by ${pid}`);

beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "lock-"));
  file = path.join(folder, "lock");
});
afterEach(() => rmSync(folder, { recursive: true }));

describe("the lock on a state folder", () => {
  it("is taken, names its process, and is gone after release", () => {
    const lock = takeLock(file, { busy });
    expect(lock.tookOver).toBe(false);
    expect(lockHolder(file)?.pid).toBe(process.pid);
    lock.release();
    expect(existsSync(file)).toBe(false);
  });

  it("is refused while the process that holds it lives", () => {
    const child = spawn("sleep", ["30"]);
    writeFileSync(file, JSON.stringify(identify(child.pid)));
    try {
      expect(() => takeLock(file, { busy })).toThrow(`held by ${child.pid}`);
      expect(JSON.parse(readFileSync(file, "utf8")).pid).toBe(child.pid);
    } finally {
      child.kill();
    }
  });

  it("is taken over when its process was killed", async () => {
    const child = spawn("sleep", ["30"]);
    writeFileSync(file, JSON.stringify(identify(child.pid)));
    child.kill("SIGKILL");
    await once(child, "exit");
    expect(takeLock(file, { busy }).tookOver).toBe(true);
    expect(lockHolder(file)?.pid).toBe(process.pid);
  });

  it("is taken over when its number now belongs to another process or another boot", () => {
    const own = identify(process.pid);
    writeFileSync(file, JSON.stringify({ ...own, startTicks: 1 }));
    expect(takeLock(file, { busy }).tookOver).toBe(true);
    writeFileSync(file, JSON.stringify({ ...own, bootId: "before the restart" }));
    expect(takeLock(file, { busy }).tookOver).toBe(true);
  });

  it("is taken over when a crash cut its content short", () => {
    writeFileSync(file, '{"pid": 12');
    expect(takeLock(file, { busy }).tookOver).toBe(true);
    writeFileSync(file, "");
    expect(takeLock(file, { busy }).tookOver).toBe(true);
  });

  it("goes to exactly one of several that start at the same moment over a stale lock", async () => {
    writeFileSync(file, JSON.stringify({ pid: 1, startTicks: -1, bootId: "gone" }));
    const program = `
      import { takeLock } from "./scripts/lib/lock-file.mjs";
      try {
        takeLock(process.argv[1], { busy: () => new Error("busy") });
        console.log("won");
        setTimeout(() => {}, 3000);
      } catch (error) { if (error.message !== "busy") throw error; }
    `;
    const racers = Array.from({ length: 6 }, () =>
      spawn(process.execPath, ["--input-type=module", "-e", program, file]),
    );
    let won = 0;
    let complaints = "";
    for (const racer of racers) {
      racer.stdout.on("data", () => (won += 1));
      racer.stderr.on("data", (chunk: Buffer) => (complaints += chunk.toString()));
    }
    await Promise.all(racers.map((racer) => once(racer, "close")));
    expect(complaints).toBe("");
    expect(won).toBe(1);
  });
});
