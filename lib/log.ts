import "server-only";
import pino from "pino";
import { env } from "@/lib/env";

const kept = globalThis as typeof globalThis & { riverlineLog?: pino.Logger };

/** JSON lines on standard output. Passwords and tokens are never passed in. */
export function log(): pino.Logger {
  kept.riverlineLog ??= pino({
    level: env().LOG_LEVEL,
    redact: ["password", "*.password", "authorization", "cookie"],
  });
  return kept.riverlineLog;
}
