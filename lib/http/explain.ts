import "server-only";
import { randomBytes } from "node:crypto";
import { AppError, ERROR_SENTENCE } from "@/lib/errors";
import { log } from "@/lib/log";
import type { ActionError } from "./action";

/** An error in words. What was not expected is logged under a number that is shown. */
export function explain(error: unknown): ActionError {
  if (error instanceof AppError) {
    return {
      code: error.code,
      message: error.message,
      ...(error.fields && { fields: error.fields }),
      ...(error.conflict && { conflict: error.conflict }),
    };
  }
  const id = randomBytes(4).toString("hex");
  log().error({ err: error, id }, "unexpected failure");
  return { code: "UNEXPECTED", message: `${ERROR_SENTENCE.UNEXPECTED} Number ${id}.`, id };
}
