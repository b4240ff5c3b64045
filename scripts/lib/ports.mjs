import { randomInt } from "node:crypto";
import net from "node:net";
import { Failure } from "./report.mjs";

// Below the range from which the kernel lends ports to outgoing connections.
const LOWEST = 20_000;
const HIGHEST = 32_000;

export function isPortFree(port, host = "127.0.0.1") {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once("error", (error) => {
      if (error.code === "EADDRINUSE" || error.code === "EACCES") resolve(false);
      else reject(error);
    });
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/** The remembered port when it is free, else another one. Never one named in `taken`. */
export async function choosePort(remembered, taken = []) {
  if (remembered && !taken.includes(remembered) && (await isPortFree(remembered))) {
    return remembered;
  }
  for (let attempt = 0; attempt < 200; attempt += 1) {
    const port = randomInt(LOWEST, HIGHEST);
    if (!taken.includes(port) && (await isPortFree(port))) return port;
  }
  throw new Failure("No free port was found on 127.0.0.1.", "Stop what is using them.");
}

export function readPort(text) {
  if (text === undefined || text === "") return 3000;
  const port = Number(text);
  if (Number.isInteger(port) && port >= 1 && port <= 65_535) return port;
  throw new Failure(
    `PORT is set to "${text}", which is not a port number.`,
    "Set it to a whole number from 1 to 65535, or leave it out for 3000.",
  );
}

export function answersOn(port, host = "127.0.0.1") {
  return new Promise((resolve) => {
    const socket = net.connect({ port, host });
    socket.once("connect", () => {
      socket.destroy();
      resolve(true);
    });
    socket.once("error", () => resolve(false));
  });
}
