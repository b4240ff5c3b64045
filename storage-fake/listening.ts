import { Server as HttpServer } from "node:http";
import type { Server } from "node:net";

const GRACE_MS = 5000;

/**
 * Listens and gives back the address with the real port.
 *
 * @param port A number from 0 to 65535 as text; 0 takes a free one.
 * @throws Error in plain words when the port is no number or is taken.
 */
export async function listen(server: Server, host: string, port: string): Promise<string> {
  if (!/^\d{1,5}$/.test(port) || Number(port) > 65_535) {
    throw new Error(`The port must be a number from 0 to 65535, not ${port}.`);
  }
  await new Promise<void>((resolve, reject) => {
    server.once("error", (error: NodeJS.ErrnoException) =>
      reject(
        error.code === "EADDRINUSE"
          ? new Error(`Port ${port} on ${host} is taken by another program.`)
          : error,
      ),
    );
    server.listen(Number(port), host, resolve);
  });
  return addressOf(server);
}

export function addressOf(server: Server): string {
  const address = server.address();
  if (address === null || typeof address === "string") throw new Error("The server has no port.");
  const host = address.family === "IPv6" ? `[${address.address}]` : address.address;
  return `http://${host}:${address.port}`;
}

/** On SIGTERM, SIGINT or SIGHUP: lets running requests end, then ends the process. */
export function closeOnSignal(servers: { close(done: () => void): unknown }[]): void {
  const stop = () => {
    setTimeout(() => process.exit(0), GRACE_MS).unref();
    let open = servers.length;
    for (const server of servers) {
      server.close(() => {
        open -= 1;
        if (open === 0) process.exit(0);
      });
      if (server instanceof HttpServer) server.closeIdleConnections();
    }
  };
  for (const signal of ["SIGTERM", "SIGINT", "SIGHUP"] as const) process.once(signal, stop);
}
