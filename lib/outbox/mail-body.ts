import "server-only";
import type { Mail } from "./mail";
import { absoluteUrl } from "./mail";

const escape = (text: string) => text.replace(/[&<>"']/g, (c) => `&#${c.charCodeAt(0)};`);

const FOOT =
  "Sent by Riverline because you are named on this case or asked for it. Answer in Riverline, not by e-mail.";

/** Plain text and HTML of a message: 600 wide, system fonts, no images, nothing fetched. */
export function mailBody(mail: Mail): { text: string; html: string } {
  const url = mail.button && absoluteUrl(mail.button.path);
  const text = [
    mail.news,
    "",
    ...mail.facts.map(([name, value]) => `${name}: ${value}`),
    ...(mail.button && url ? ["", `${mail.button.label}: ${url}`] : []),
    ...(mail.after ? ["", mail.after] : []),
    "",
    FOOT,
  ].join("\n");
  const rows = mail.facts
    .map(
      ([name, value]) =>
        `<tr><td style="padding:4px 16px 4px 0;color:#5a656f;vertical-align:top">${escape(name)}</td><td style="padding:4px 0">${escape(value)}</td></tr>`,
    )
    .join("");
  const button =
    mail.button && url
      ? `<p style="margin:20px 0"><a href="${escape(url)}" style="display:inline-block;padding:10px 16px;background:#1b4f7e;color:#ffffff;text-decoration:none;border-radius:3px">${escape(mail.button.label)}</a></p>`
      : "";
  const html = `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escape(mail.subject)}</title></head><body style="margin:0;background:#eceff1;color:#14191e;font:15px/22px system-ui,-apple-system,'Segoe UI',sans-serif"><div style="max-width:600px;margin:0 auto;padding:24px"><div style="background:#ffffff;border:1px solid #b3bcc4;border-radius:4px;padding:24px"><p style="margin:0 0 16px;font-weight:600">Riverline</p><p style="margin:0 0 16px;white-space:pre-line">${escape(mail.news)}</p><table role="presentation" style="border-collapse:collapse;font-size:14px">${rows}</table>${button}${mail.after ? `<p style="margin:16px 0 0;white-space:pre-line">${escape(mail.after)}</p>` : ""}</div><p style="margin:12px 0;color:#5a656f;font-size:12px">${FOOT}</p></div></body></html>`;
  return { text, html };
}
