import { S3ServiceException } from "@aws-sdk/client-s3";

/** Status and code of a refused request; fails when the request was let through. */
export async function refusal(answer: Promise<unknown>): Promise<{ status: number; code: string }> {
  try {
    await answer;
  } catch (error) {
    if (!(error instanceof S3ServiceException)) throw error;
    return { status: error.$metadata.httpStatusCode ?? 0, code: error.name };
  }
  throw new Error("The request was accepted but should have been refused.");
}
