import { NoAnswer, Refused } from "./ask-server";

/**
 * Sends bytes to the store and tells how far it is; `fetch` cannot tell that.
 * @returns the ETag that the store gave
 * @throws NoAnswer when trying again, with a fresh address, may help
 */
export function putBytes(
  url: string,
  bytes: Blob,
  options: { mediaType?: string; signal: AbortSignal; onProgress: (sent: number) => void },
): Promise<string> {
  const { mediaType, signal, onProgress } = options;
  return new Promise((resolve, reject) => {
    if (signal.aborted) {
      reject(signal.reason);
      return;
    }
    const request = new XMLHttpRequest();
    const stop = () => request.abort();
    signal.addEventListener("abort", stop, { once: true });
    request.open("PUT", url);
    if (mediaType) request.setRequestHeader("content-type", mediaType);
    request.upload.addEventListener("progress", (event) => onProgress(event.loaded));
    request.addEventListener("loadend", () => signal.removeEventListener("abort", stop));
    request.addEventListener("load", () => {
      const etag = request.getResponseHeader("etag");
      if (request.status >= 200 && request.status < 300 && etag) resolve(etag);
      // 403 is an address that is too old; the next try gets a new one.
      else if (request.status === 403 || request.status === 429 || request.status >= 500)
        reject(new NoAnswer(`The store answered ${request.status}.`));
      else reject(new Refused(`The store refused the file (${request.status}).`));
    });
    request.addEventListener("error", () => reject(new NoAnswer("The store did not answer.")));
    request.addEventListener("abort", () => reject(signal.reason));
    request.send(bytes);
  });
}
