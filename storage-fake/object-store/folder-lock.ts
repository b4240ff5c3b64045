import { createHash } from "node:crypto";
import { realpath } from "node:fs/promises";
import { type Server, createServer } from "node:net";

/**
 * Keeps a second store off the folder: it would sweep the first one's half-written files.
 * An abstract Linux socket is the lock; the kernel frees it however the process ends.
 *
 * @throws Error when another process holds the folder.
 */
export async function lockFolder(folder: string): Promise<Server> {
  const real = await realpath(folder);
  const name = createHash("sha256").update(real).digest("hex").slice(0, 32);
  const server = createServer();
  await new Promise<void>((resolve, reject) => {
    server.once("error", (error: NodeJS.ErrnoException) =>
      reject(
        error.code === "EADDRINUSE"
          ? new Error(`Another object store is already running on the folder ${real}.`)
          : error,
      ),
    );
    server.listen(`\0object-store-${name}`, resolve);
  });
  server.unref();
  return server;
}
