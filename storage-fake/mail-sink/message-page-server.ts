import { type IncomingMessage, type Server, type ServerResponse, createServer } from "node:http";
import { type ParsedMail, simpleParser } from "mailparser";
import type { MessageStore, MessageSummary } from "./message-store";
import { listPage, messagePage, problemPage } from "./pages";
import { STYLESHEET } from "./stylesheet";

const OWN_PAGES =
  "default-src 'none'; style-src 'self'; frame-src 'self'; form-action 'self'; base-uri 'none'; frame-ancestors 'none'";
const FOREIGN_HTML =
  "sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-ancestors 'self'";
const LOOPBACK = /^(localhost|127\.0\.0\.1|\[::1\])(:\d+)?$/;

function send(
  response: ServerResponse,
  status: number,
  type: string,
  body: string | Buffer,
  headers: Record<string, string> = {},
): void {
  const bytes = Buffer.from(body);
  response.writeHead(status, {
    "Content-Type": type,
    "Content-Length": bytes.length,
    "Content-Security-Policy": OWN_PAGES,
    "X-Content-Type-Options": "nosniff",
    "Referrer-Policy": "no-referrer",
    "Cache-Control": "no-store",
    ...headers,
  });
  response.end(bytes);
}

function sendPage(response: ServerResponse, status: number, body: string): void {
  send(response, status, "text/html; charset=utf-8", body);
}

function sendJson(response: ServerResponse, status: number, value: unknown): void {
  send(response, status, "application/json; charset=utf-8", JSON.stringify(value));
}

function messageJson(summary: MessageSummary, mail: ParsedMail) {
  return {
    ...summary,
    text: mail.text ?? "",
    html: mail.html,
    attachments: mail.attachments.map(({ filename, contentType, size }) => ({
      filename: filename ?? null,
      contentType,
      sizeBytes: size,
    })),
  };
}

async function sendMessage(
  response: ServerResponse,
  store: MessageStore,
  summary: MessageSummary,
  rest: string,
  query: URLSearchParams,
): Promise<void> {
  const source = await store.source(summary);
  const download = (name: string) => ({
    "Content-Disposition": `attachment; filename*=UTF-8''${encodeURIComponent(name)}`,
  });
  if (rest === "/source") return send(response, 200, "text/plain; charset=utf-8", source);
  const mail = await simpleParser(source);
  if (rest === ".json") return sendJson(response, 200, messageJson(summary, mail));
  if (rest === "") {
    const part = query.get("part") === "html" ? "html" : "text";
    return sendPage(response, 200, messagePage(summary, mail, part));
  }
  if (rest === "/html" && typeof mail.html === "string") {
    return send(response, 200, "text/html; charset=utf-8", mail.html, {
      "Content-Security-Policy": FOREIGN_HTML,
    });
  }
  const place = /^\/attachments\/(\d{1,4})$/.exec(rest)?.[1];
  const file = place === undefined ? undefined : mail.attachments[Number(place)];
  if (!file) return sendPage(response, 404, problemPage("Not found", "There is no such part."));
  send(
    response,
    200,
    "application/octet-stream",
    file.content,
    download(file.filename ?? `attachment-${Number(place) + 1}`),
  );
}

async function handle(
  store: MessageStore,
  request: IncomingMessage,
  response: ServerResponse,
): Promise<void> {
  // A foreign site whose name points to this machine must not read sign-in links.
  if (!LOOPBACK.test(request.headers.host ?? "")) {
    const sentence = "Open this page as localhost or 127.0.0.1.";
    return sendPage(response, 403, problemPage("Not allowed", sentence));
  }
  if (request.method !== "GET" && request.method !== "HEAD") {
    const sentence = "Messages can only be read here.";
    return sendPage(response, 405, problemPage("Not allowed", sentence));
  }
  const url = new URL(request.url ?? "/", "http://localhost");
  const query = url.searchParams;
  if (url.pathname === "/_fake/health") return sendJson(response, 200, { status: "ok" });
  if (url.pathname === "/style.css") {
    return send(response, 200, "text/css; charset=utf-8", STYLESHEET);
  }
  if (url.pathname === "/") {
    const to = query.get("to") ?? "";
    const first = Number(query.get("first") ?? 0);
    const start = Number.isInteger(first) && first > 0 ? first : 0;
    return sendPage(response, 200, listPage(store.list({ to }), to, start));
  }
  if (url.pathname === "/messages.json") {
    const since = query.get("since") ?? undefined;
    if (since !== undefined && Number.isNaN(Date.parse(since))) {
      return sendJson(response, 400, { error: "since must be a date and time of ISO 8601." });
    }
    return sendJson(response, 200, store.list({ to: query.get("to") ?? "", since }));
  }
  const [, id = "", rest = ""] = /^\/messages\/([0-9]+-[0-9a-f]+)(.*)$/.exec(url.pathname) ?? [];
  const summary = store.summary(id);
  if (summary) return sendMessage(response, store, summary, rest, query);
  if (url.pathname.endsWith(".json")) {
    return sendJson(response, 404, { error: "There is no such message." });
  }
  sendPage(response, 404, problemPage("Not found", "There is no such message."));
}

/** The page that shows the messages, with the same as JSON for tests. */
export function createMessagePageServer(store: MessageStore): Server {
  return createServer((request, response) => {
    handle(store, request, response).catch((error: unknown) => {
      console.error(error);
      if (response.headersSent) response.destroy();
      else sendPage(response, 500, problemPage("Not shown", "The log of the mail sink says why."));
    });
  });
}
