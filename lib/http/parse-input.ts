import "server-only";
import type { z } from "zod";
import { AppError, type FieldErrors } from "@/lib/errors";
import { wellFormed } from "./well-formed";

/** @throws AppError INVALID with a message for each field, in the words of the schema. */
export function parseInput<S extends z.ZodType>(schema: S, raw: unknown): z.output<S> {
  const result = schema.safeParse(raw);
  if (result.success) return wellFormed(result.data);
  const fields: FieldErrors = {};
  for (const issue of result.error.issues) fields[issue.path.join(".")] ??= issue.message;
  throw new AppError("INVALID", undefined, { fields });
}
