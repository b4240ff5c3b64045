import { createHash } from "node:crypto";
import { readFile } from "node:fs/promises";
import { removeIfThere } from "./disk";
import { StoreError, malformedXml } from "./errors";
import { receiveBody } from "./receive-body";
import type { StoreRequest } from "./request";
import type { VerifiedSignature } from "./signature";
import { type XmlElement, parseXml } from "./xml";

const MAX_XML_BYTES = 4 * 1024 ** 2;

/** Reads and checks an XML body of at most 4 MiB. Null when the body is empty. */
export async function readXmlBody(
  request: StoreRequest,
  signed: VerifiedSignature,
  temporaryPath: string,
  rootName: string,
): Promise<XmlElement | null> {
  const length = Number(request.header("content-length") ?? 0);
  if (length > MAX_XML_BYTES) {
    throw new StoreError(400, "MaxMessageLengthExceeded", "The request is longer than 4 MiB.");
  }
  if (length === 0 && request.header("transfer-encoding") === undefined) {
    const empty = createHash("sha256").digest("hex");
    if (/^[0-9a-f]{64}$/.test(signed.payloadHash) && signed.payloadHash !== empty) {
      throw new StoreError(400, "XAmzContentSHA256Mismatch", "The body is missing.");
    }
    return null;
  }
  const { path } = await receiveBody(request, signed, temporaryPath);
  const text = await readFile(path, "utf8");
  await removeIfThere(path);
  try {
    const root = parseXml(text);
    if (root.name !== rootName) throw malformedXml();
    return root;
  } catch (error) {
    if (error instanceof SyntaxError || error instanceof RangeError) throw malformedXml();
    throw error;
  }
}
