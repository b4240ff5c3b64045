import { createHash } from "node:crypto";
import { vi } from "vitest";
import type { UploadStatus, UploadTicket } from "@/lib/uploads/schemas";

export const sha256Of = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");

export type Asked = { method: string; path: string; body: unknown };

type Given = {
  ticket?: UploadTicket;
  unfinished?: UploadStatus[];
  /** Answers to "where does it stand", in their order; the last one stays. */
  standing?: UploadStatus[];
  /** HTTP status that the store gives to each address; 200 unless named. */
  storeStatus?: (url: string) => number;
};

export const aStatus = (given: Partial<UploadStatus>): UploadStatus => ({
  uploadId: "upl_1",
  caseId: "case_1",
  purpose: "image",
  state: "sent",
  fileName: "face.tif",
  sizeBytes: 100,
  sentBytes: 0,
  startedAt: "2026-11-20T09:00:00.000Z",
  refusal: null,
  imageId: null,
  imageLabel: null,
  ...given,
});

/** Stands in for the portal's answers and for the store, and keeps what was asked and sent. */
export function fakePortal(given: Given) {
  const asked: Asked[] = [];
  const sent = new Map<string, Uint8Array>();
  const standing = [...(given.standing ?? [aStatus({})])];

  function answer({ method, path, body }: Asked): unknown {
    if (method === "GET" && path.startsWith("/api/uploads?"))
      return { uploads: given.unfinished ?? [] };
    if (method === "POST" && path === "/api/uploads") return given.ticket;
    if (path.endsWith("/parts")) {
      const want = (body as { want?: number[] }).want ?? [];
      return { parts: want.map((partNumber) => ({ partNumber, url: `store:${partNumber}` })) };
    }
    if (path.endsWith("/finish")) return aStatus({ state: "sent" });
    if (method === "DELETE") return undefined;
    return standing.length > 1 ? standing.shift() : standing[0];
  }

  vi.stubGlobal("fetch", (path: string, init: RequestInit = {}) => {
    const body: unknown = typeof init.body === "string" ? JSON.parse(init.body) : null;
    const call = { method: init.method ?? "GET", path, body };
    asked.push(call);
    const said = answer(call);
    return Promise.resolve(
      said === undefined ? new Response(null, { status: 204 }) : Response.json(said),
    );
  });

  class StoreRequest extends EventTarget {
    upload = new EventTarget();
    status = 0;
    #url = "";
    open(_method: string, url: string) {
      this.#url = url;
    }
    setRequestHeader() {}
    getResponseHeader() {
      return `"etag of ${this.#url}"`;
    }
    abort() {
      this.dispatchEvent(new Event("abort"));
      this.dispatchEvent(new Event("loadend"));
    }
    send(bytes: Blob) {
      void bytes.arrayBuffer().then((buffer) => {
        this.status = given.storeStatus?.(this.#url) ?? 200;
        if (this.status < 300) sent.set(this.#url, new Uint8Array(buffer));
        this.upload.dispatchEvent(new ProgressEvent("progress", { loaded: buffer.byteLength }));
        this.dispatchEvent(new Event("load"));
        this.dispatchEvent(new Event("loadend"));
      });
    }
  }
  vi.stubGlobal("XMLHttpRequest", StoreRequest);
  const askedFor = (method: string, end: string) =>
    asked.filter((call) => call.method === method && call.path.endsWith(end));
  return { askedFor, sent };
}
