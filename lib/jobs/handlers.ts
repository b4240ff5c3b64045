import "server-only";
import type { JobKind } from "./constants";
import type { JobHandler } from "./handler";
import { sendMailJob } from "@/lib/outbox/send-mail-job";
import { takeInImageJob } from "@/lib/images/take-in-image-job";
import { tidyUploadsJob } from "@/lib/uploads/tidy-uploads-job";
import { storeReportJob } from "@/lib/reports/store-report-job";

export const handlers: Record<JobKind, JobHandler> = {
  "mail.send": sendMailJob,
  "image.take-in": takeInImageJob,
  "upload.tidy": tidyUploadsJob,
  "report.store": storeReportJob,
};
