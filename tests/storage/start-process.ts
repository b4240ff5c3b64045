import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { createInterface } from "node:readline";

export interface Started {
  child: ChildProcess;
  /** The line it printed when it was ready. */
  line: string;
}

/** Starts a program of storage-fake and waits for its ready line. */
export async function startProcess(
  script: string,
  args: string[],
  env: Record<string, string> = {},
): Promise<Started> {
  const child = spawn(process.execPath, ["--import", "tsx", script, ...args], {
    env: { ...process.env, ...env },
    stdio: ["ignore", "pipe", "pipe"],
  });
  let complaint = "";
  child.stderr.on("data", (chunk: Buffer) => (complaint += chunk.toString()));
  const lines = createInterface({ input: child.stdout });
  const line = await new Promise<string>((resolve, reject) => {
    lines.once("line", resolve);
    child.once("exit", (code) => reject(new Error(`${script} ended with ${code}: ${complaint}`)));
  });
  return { child, line };
}

/** Ends a started program and waits until it is gone. */
export async function endProcess(
  { child }: Started,
  signal: "SIGTERM" | "SIGKILL" = "SIGTERM",
): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = once(child, "exit");
  child.kill(signal);
  await gone;
}
