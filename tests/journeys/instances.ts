import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import {
  createServer,
  type IncomingHttpHeaders,
  type IncomingMessage,
  request as forward,
  type ServerResponse,
} from "node:http";
import type { AddressInfo } from "node:net";
import { setTimeout as sleep } from "node:timers/promises";

/** A web server and a worker, as one machine of a larger laboratory runs them. */
export type Instance = {
  address: string;
  port: number;
  /** How many requests the one address passed to it. */
  served: number;
  kill: () => Promise<void>;
};
export type Cluster = { address: string; instances: Instance[]; stop: () => Promise<void> };

/** Where the balancer says that every caller comes from: an address kept for documentation. */
const CALLER = "203.0.113.7";
const NEXT = "node_modules/next/dist/bin/next";
const WORKER = ["--conditions=react-server", "--import", "tsx", "scripts/worker.ts"];

/** Several instances on one database and one store, behind one address that asks them in turn. */
export async function startCluster(count: number): Promise<Cluster> {
  const instances: Instance[] = [];
  const balancer = createServer((incoming, answer) => {
    passOn(instances, incoming, answer).catch((error: unknown) => answer.destroy(asError(error)));
  });
  balancer.listen(0, "127.0.0.1");
  await once(balancer, "listening");
  const address = `http://127.0.0.1:${portOf(balancer)}`;
  for (let i = 0; i < count; i++) instances.push(await startInstance(address));
  return {
    address,
    instances,
    stop: async () => {
      balancer.closeAllConnections();
      balancer.close();
      for (const instance of instances) await instance.kill();
    },
  };
}

async function startInstance(publicAddress: string): Promise<Instance> {
  const port = await freePort();
  const address = `http://127.0.0.1:${port}`;
  const env: NodeJS.ProcessEnv = {
    ...process.env,
    NODE_ENV: "production",
    NEXTAUTH_URL: publicAddress,
    TRUST_PROXY: "1",
  };
  const children = [
    run([NEXT, "start", "-H", "127.0.0.1", "-p", String(port)], env),
    run(WORKER, env),
  ];
  const kill = async () => {
    for (const child of children) await end(child);
  };
  for (let tries = 0; tries < 120; tries++) {
    const answer = await fetch(`${address}/api/health`).catch(() => null);
    if (answer?.status === 200) return { address, port, served: 0, kill };
    await sleep(500);
  }
  await kill();
  throw new Error(`no instance answered at ${address}`);
}

function run(args: string[], env: NodeJS.ProcessEnv): ChildProcess {
  return spawn(process.execPath, args, { env, stdio: ["ignore", "ignore", "inherit"] });
}

/** Without a word, as when a machine loses its power. */
async function end(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = once(child, "exit");
  child.kill("SIGKILL");
  await gone;
}

/** Asks the instance that was asked least; one that does not answer is passed over. */
async function passOn(
  instances: readonly Instance[],
  incoming: IncomingMessage,
  answer: ServerResponse,
): Promise<void> {
  const chunks: Buffer[] = [];
  for await (const chunk of incoming) chunks.push(Buffer.from(chunk));
  const headers = { ...incoming.headers, "x-forwarded-for": CALLER };
  for (const instance of [...instances].sort((a, b) => a.served - b.served)) {
    instance.served += 1;
    const theirs = await ask(instance, incoming, headers, Buffer.concat(chunks));
    if (!theirs) continue;
    answer.writeHead(theirs.statusCode ?? 502, theirs.headers);
    theirs.pipe(answer);
    return;
  }
  answer.writeHead(502).end();
}

/** Null when nobody listens there, or nobody answers a question that may be asked again. */
async function ask(
  { port }: Instance,
  { method, url }: IncomingMessage,
  headers: IncomingHttpHeaders,
  body: Buffer,
): Promise<IncomingMessage | null> {
  const asked = forward({ host: "127.0.0.1", port, method, path: url, headers, agent: false });
  asked.end(body);
  try {
    const [theirs]: IncomingMessage[] = await once(asked, "response");
    return theirs ?? null;
  } catch (error) {
    if (asError(error).code === "ECONNREFUSED" || method === "GET") return null;
    throw error;
  }
}

const asError = (error: unknown): NodeJS.ErrnoException =>
  error instanceof Error ? error : new Error(String(error));

function portOf(server: ReturnType<typeof createServer>): number {
  const bound: AddressInfo | string | null = server.address();
  if (bound === null || typeof bound === "string") throw new Error("the balancer has no port");
  return bound.port;
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, "127.0.0.1");
  await once(probe, "listening");
  const port = portOf(probe);
  probe.close();
  await once(probe, "close");
  return port;
}
