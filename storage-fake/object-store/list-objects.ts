import { StoreError, notImplemented } from "./errors";
import { compareKeys } from "./keys";
import { listPage } from "./listing";
import { type Handler, bucketOf, sendXml, wholeNumber } from "./operation";
import type { XmlNode } from "./xml";

function readToken(token: string): string {
  const text = Buffer.from(token, "base64url").toString("utf8");
  if (Buffer.from(text, "utf8").toString("base64url") !== token || text === "") {
    throw new StoreError(400, "InvalidArgument", "The continuation token is not one of ours.");
  }
  return text;
}

/** ListObjectsV2. */
export const listObjects: Handler = async (context) => {
  const { request } = context;
  const bucket = bucketOf(context);
  if (request.queryValue("list-type") !== "2") throw notImplemented("this listing");
  const encoding = request.queryValue("encoding-type");
  if (encoding !== undefined && encoding !== "url") throw notImplemented(`encoding ${encoding}`);
  const shown = (text: string) => (encoding ? encodeURIComponent(text) : text);

  const prefix = request.queryValue("prefix") ?? "";
  const delimiter = request.queryValue("delimiter") ?? "";
  const token = request.queryValue("continuation-token");
  const startAfter = request.queryValue("start-after");
  const limit = wholeNumber(context, "max-keys", { fallback: 1000, least: 0, most: 1000 });
  const after = token === undefined ? (startAfter ?? "") : readToken(token);
  const page = listPage(await bucket.index.all(), { prefix, delimiter, after, limit }, compareKeys);
  const more = page.next !== null && limit > 0;

  const optional = (name: string, value: string | undefined): XmlNode[] =>
    value === undefined ? [] : [[name, value]];
  sendXml(context, "ListBucketResult", [
    ["Name", bucket.name],
    ["Prefix", shown(prefix)],
    ...optional("Delimiter", delimiter === "" ? undefined : shown(delimiter)),
    ...optional("EncodingType", encoding),
    ...optional("ContinuationToken", token),
    ...optional("StartAfter", startAfter === undefined ? undefined : shown(startAfter)),
    ["KeyCount", page.items.length + page.commonPrefixes.length],
    ["MaxKeys", limit],
    ["IsTruncated", String(more)],
    ...optional(
      "NextContinuationToken",
      more ? Buffer.from(page.next ?? "", "utf8").toString("base64url") : undefined,
    ),
    ...page.items.map((item): XmlNode => [
      "Contents",
      [
        ["Key", shown(item.key)],
        ["LastModified", item.lastModified],
        ["ETag", `"${item.etag}"`],
        ["Size", item.size],
        ["StorageClass", "STANDARD"],
      ],
    ]),
    ...page.commonPrefixes.map((common): XmlNode => [
      "CommonPrefixes",
      [["Prefix", shown(common)]],
    ]),
  ]);
};
