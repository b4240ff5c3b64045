import { renderXml } from "./xml";

/** A refusal in the words and codes of S3; the server turns it into the XML error body. */
export class StoreError extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    message: string,
  ) {
    super(message);
    this.name = "StoreError";
  }
}

/** What this store cannot do is refused, never half done: an ignored option could cost an object. */
export function notImplemented(what: string): StoreError {
  return new StoreError(501, "NotImplemented", `This store does not implement ${what}.`);
}

export function noSuchKey(key: string): StoreError {
  return new StoreError(404, "NoSuchKey", `There is no object under the key ${key}.`);
}

export function noSuchUpload(): StoreError {
  return new StoreError(
    404,
    "NoSuchUpload",
    "There is no such multipart upload. It was completed, aborted or never created.",
  );
}

export function preconditionFailed(): StoreError {
  return new StoreError(412, "PreconditionFailed", "A condition of the request does not hold.");
}

export function malformedXml(): StoreError {
  return new StoreError(400, "MalformedXML", "The XML of the request is not well formed.");
}

export function errorBody(error: StoreError, resource: string, requestId: string): string {
  return renderXml(
    "Error",
    [
      ["Code", error.code],
      ["Message", error.message],
      ["Resource", resource],
      ["RequestId", requestId],
    ],
    { namespace: false },
  );
}
