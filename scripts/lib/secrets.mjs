import { randomBytes } from "node:crypto";
import path from "node:path";
import { readPrivateJson, writePrivateJson } from "./private-file.mjs";
import { choosePort } from "./ports.mjs";

const random = (bytes) => randomBytes(bytes).toString("base64url");

/** Passwords and keys of the local services, made once and kept. */
export function localSecrets(folder) {
  const file = path.join(folder, "secrets.json");
  const kept = readPrivateJson(file) ?? {};
  const secrets = {
    databasePassword: random(24),
    nextAuthSecret: random(32),
    s3AccessKeyId: random(12),
    s3SecretAccessKey: random(30),
    ...kept,
  };
  if (Object.keys(kept).length !== Object.keys(secrets).length) writePrivateJson(file, secrets);
  return secrets;
}

/** Ports of the local services: chosen once and kept, so that addresses survive a restart. */
export async function localPorts(folder, webPort) {
  const file = path.join(folder, "ports.json");
  const kept = readPrivateJson(file) ?? {};
  const ports = {};
  for (const name of ["database", "store", "smtp", "mailPage"]) {
    ports[name] = await choosePort(kept[name], [webPort, ...Object.values(ports)]);
  }
  if (JSON.stringify(kept) !== JSON.stringify(ports)) writePrivateJson(file, ports);
  return ports;
}
