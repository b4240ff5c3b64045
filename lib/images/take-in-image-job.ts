import "server-only";
import type { JobHandler } from "@/lib/jobs/handler";

export const takeInImageJob: JobHandler = {
  run() {
    return Promise.reject(new Error("not built yet"));
  },
};
