import type { ParsedMail } from "mailparser";
import { Html, html, linkedText } from "./html";
import type { MessageSummary } from "./message-store";

const PAGE_SIZE = 100;

const TIME = new Intl.DateTimeFormat("en-GB", {
  dateStyle: "medium",
  timeStyle: "medium",
  timeZone: "UTC",
});

function shownTime(iso: string): string {
  return `${TIME.format(new Date(iso))} UTC`;
}

function shownSize(bytes: number): string {
  if (bytes < 1024) return `${bytes}\u00a0B`;
  if (bytes < 1024 ** 2) return `${(bytes / 1024).toFixed(1)}\u00a0KiB`;
  return `${(bytes / 1024 ** 2).toFixed(1)}\u00a0MiB`;
}

function page(title: string, body: Html): string {
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>${title}</title>
        <link rel="stylesheet" href="/style.css" />
      </head>
      <body>
        <header>
          <p class="notice">
            These messages were not sent anywhere. They were written to this machine only.
          </p>
        </header>
        <main>${body}</main>
      </body>
    </html>`.text;
}

function row(message: MessageSummary): Html {
  return html`<tr>
    <td class="time">${shownTime(message.receivedAt)}</td>
    <td>${message.envelopeTo.join(", ")}</td>
    <td><a href="/messages/${message.id}">${message.subject || "No subject"}</a></td>
    <td class="size">${shownSize(message.sizeBytes)}</td>
  </tr>`;
}

function table(messages: MessageSummary[]): Html {
  return html`<div class="scroll">
    <table>
      <thead>
        <tr>
          <th scope="col">Received</th>
          <th scope="col">To</th>
          <th scope="col">Subject</th>
          <th scope="col">Size</th>
        </tr>
      </thead>
      <tbody>
        ${messages.map(row)}
      </tbody>
    </table>
  </div>`;
}

/**
 * The list, newest first.
 *
 * @param first Place of the first message shown, counted from 0.
 */
export function listPage(all: MessageSummary[], to: string, first: number): string {
  const shown = all.slice(first, first + PAGE_SIZE);
  const query = to === "" ? "" : `to=${encodeURIComponent(to)}&`;
  const older = first + PAGE_SIZE < all.length;
  return page(
    "Messages",
    html`<h1>Messages</h1>
      <form action="/" method="get">
        <label for="to">Sent to</label>
        <input id="to" name="to" value="${to}" />
        <button type="submit">Show</button>
        <a href="/">All messages</a>
      </form>
      ${
        shown.length > 0
          ? table(shown)
          : html`<p>
              ${to === "" ? "No message has arrived yet." : "No message to this address."}
            </p>`
      }
      <p>
        ${all.length} in all.
        ${
          first > 0
            ? html`<a href="/?${query}first=${Math.max(0, first - PAGE_SIZE)}">Newer</a>`
            : ""
        }
        ${older ? html`<a href="/?${query}first=${first + PAGE_SIZE}">Older</a>` : ""}
      </p>`,
  );
}

function attachmentList(id: string, mail: ParsedMail): Html {
  if (mail.attachments.length === 0) return html``;
  const items = mail.attachments.map(
    (file, place) =>
      html`<li>
        <a href="/messages/${id}/attachments/${place}"
          >${file.filename ?? `Attachment ${place + 1}`}</a
        >
        (${file.contentType}, ${shownSize(file.size)})
      </li>`,
  );
  return html`<h2>Attachments</h2>
    <ul>
      ${items}
    </ul>`;
}

/** One message: the text part, or the HTML part in a frame without scripts, forms or network. */
export function messagePage(message: MessageSummary, mail: ParsedMail, part: "text" | "html") {
  const other =
    typeof mail.html !== "string"
      ? html`No HTML part`
      : part === "text"
        ? html`<a href="/messages/${message.id}?part=html">Show the HTML part</a>`
        : html`<a href="/messages/${message.id}">Show the text part</a>`;
  const content =
    part === "html" && typeof mail.html === "string"
      ? html`<iframe
          title="HTML part of the message"
          sandbox=""
          src="/messages/${message.id}/html"
        ></iframe>`
      : html`<pre>${linkedText(mail.text ?? "This message has no text.")}</pre>`;
  return page(
    message.subject || "No subject",
    html`<p><a href="/">All messages</a></p>
      <h1>${message.subject || "No subject"}</h1>
      <dl>
        <dt>Received</dt>
        <dd>${shownTime(message.receivedAt)}</dd>
        <dt>From</dt>
        <dd>${message.from || message.envelopeFrom}</dd>
        <dt>To</dt>
        <dd>${message.to || "–"}</dd>
        <dt>Delivered to</dt>
        <dd>${message.envelopeTo.join(", ")}</dd>
      </dl>
      <p>${other} · <a href="/messages/${message.id}/source">Source</a></p>
      ${content} ${attachmentList(message.id, mail)}`,
  );
}

export function problemPage(title: string, sentence: string): string {
  return page(
    title,
    html`<h1>${title}</h1>
      <p>${sentence}</p>
      <p><a href="/">All messages</a></p>`,
  );
}
