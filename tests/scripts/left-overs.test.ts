import { spawn } from "node:child_process";
import { once } from "node:events";
import { describe, expect, it } from "vitest";
import { endLeftOvers, originMarks } from "../../scripts/lib/left-overs.mjs";

const start = (folder: string, name: string) =>
  spawn("sleep", ["60"], { env: { ...process.env, ...originMarks(folder, name) } });

describe("what a killed start left running", () => {
  it("is found by its folder and ended, and nothing else is touched", async () => {
    const mine = [start("/state/one", "database"), start("/state/one", "web")];
    const other = start("/state/one-more", "database");
    const ended = mine.map((child) => once(child, "exit"));
    await once(other, "spawn");
    expect((await endLeftOvers("/state/one")).sort()).toEqual(["database", "web"]);
    await Promise.all(ended);
    expect(other.exitCode).toBe(null);
    expect(other.signalCode).toBe(null);
    other.kill();
    expect(await endLeftOvers("/state/one")).toEqual([]);
  });
});
