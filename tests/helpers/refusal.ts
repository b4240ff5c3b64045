import { AppError } from "@/lib/errors";

/** The refusal that this work ends in; anything else, a success too, fails the test. */
export async function refusal(work: Promise<unknown>): Promise<AppError> {
  const error: unknown = await work.then(
    () => new Error("it was not refused"),
    (reason: unknown) => reason,
  );
  if (error instanceof AppError) return error;
  throw error;
}
