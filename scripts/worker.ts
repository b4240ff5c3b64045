import { closeDatabase } from "@/db/client";
import { env } from "@/lib/env";
import { work } from "@/lib/jobs/worker";
import { log } from "@/lib/log";
import { scheduleTidy } from "@/lib/uploads/schedule-tidy";

const stop = new AbortController();
for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"] as const) {
  process.once(signal, () => stop.abort());
}
await scheduleTidy(new Date());
console.log("worker ready");
await work(stop.signal, env().WORKER_CONCURRENCY);
await closeDatabase();
log().info("worker stopped");
