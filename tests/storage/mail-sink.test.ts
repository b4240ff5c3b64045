import { mkdtemp, rm } from "node:fs/promises";
import { request } from "node:http";
import os from "node:os";
import path from "node:path";
import { createTransport } from "nodemailer";
import { afterAll, beforeAll, expect, it } from "vitest";
import { type Started, endProcess, startProcess } from "./start-process";

const MAIN = "storage-fake/mail-sink/main.ts";
const script = "<script>alert(1)</script>";

let folder: string;
let started: Started;
let smtpPort: number;
let page: string;

async function start(): Promise<void> {
  started = await startProcess(MAIN, ["--folder", folder]);
  const [smtp, http] = started.line.match(/\w+:\/\/[^ ]+/g) ?? [];
  smtpPort = Number(new URL(smtp ?? "").port);
  page = http ?? "";
}

beforeAll(async () => {
  folder = await mkdtemp(path.join(os.tmpdir(), "mail-sink-"));
  await start();
});
afterAll(async () => {
  await endProcess(started);
  await rm(folder, { recursive: true });
});

async function send(message: object): Promise<void> {
  const transport = createTransport({
    host: "127.0.0.1",
    port: smtpPort,
    secure: false,
    ignoreTLS: true,
  });
  await transport.sendMail({ from: "Laboratory <lab@lab.example>", ...message });
  transport.close();
}

interface Listed {
  id: string;
  subject: string;
  envelopeTo: string[];
  receivedAt: string;
}

async function list(query = ""): Promise<Listed[]> {
  const answer = await fetch(`${page}/messages.json${query}`);
  expect(answer.status).toBe(200);
  return (await answer.json()) as Listed[];
}

it("shows an empty list", async () => {
  expect(await list()).toEqual([]);
  expect(await (await fetch(page)).text()).toContain("No message has arrived yet.");
});

it("keeps a message with UTF-8 subject, both parts and an attachment", async () => {
  await send({
    to: "Zoë <zoe@client.example>",
    bcc: "hidden@lab.example",
    subject: "Prüfbericht ≥ 620 HV: 応力 " + script,
    text: `Open https://bench.example/reset?token=a&b=c. ${script}`,
    html: `<p>Open</p>${script}<img src="http://track.example/x.png">`,
    attachments: [{ filename: "Befund ü.pdf", content: Buffer.from("%PDF-1.7 bytes") }],
  });
  const [message] = await list("?to=ZOE@client");
  expect(message).toMatchObject({
    subject: `Prüfbericht ≥ 620 HV: 応力 ${script}`,
    envelopeTo: ["zoe@client.example", "hidden@lab.example"],
  });
  const whole = (await (await fetch(`${page}/messages/${message?.id}.json`)).json()) as object;
  expect(whole).toMatchObject({
    text: expect.stringContaining("https://bench.example/reset?token=a&b=c"),
    html: expect.stringContaining("<p>Open</p>"),
    attachments: [{ filename: "Befund ü.pdf", contentType: "application/pdf", sizeBytes: 14 }],
  });
  const file = await fetch(`${page}/messages/${message?.id}/attachments/0`);
  expect(await file.text()).toBe("%PDF-1.7 bytes");
  expect(file.headers.get("content-disposition")).toContain("Befund%20%C3%BC.pdf");
  expect(await (await fetch(`${page}/messages/${message?.id}/source`)).text()).toContain(
    "MIME-Version: 1.0",
  );
});

it("escapes what it shows and keeps foreign HTML in a sandbox", async () => {
  const id = (await list())[0]?.id;
  for (const address of [`${page}/`, `${page}/messages/${id}`, `${page}/?to=${script}`]) {
    const answer = await fetch(address);
    const text = await answer.text();
    expect(text).toContain("These messages were not sent anywhere.");
    expect(text).not.toContain("<script");
    expect(answer.headers.get("content-security-policy")).toContain("default-src 'none'");
  }
  const text = await (await fetch(`${page}/messages/${id}`)).text();
  expect(text).toContain('href="https://bench.example/reset?token=a&#38;b=c"');
  const framed = await (await fetch(`${page}/messages/${id}?part=html`)).text();
  expect(framed).toMatch(/<iframe[^>]*sandbox=""/);
  const html = await fetch(`${page}/messages/${id}/html`);
  expect(html.headers.get("content-security-policy")).toMatch(/^sandbox; default-src 'none'/);
});

it("lists newest first, since a moment, and keeps all over a kill", async () => {
  await send({ to: "second@client.example", subject: "Second", text: "2" });
  const both = await list();
  expect(both.map(({ subject }) => subject.slice(0, 6))).toEqual(["Second", "Prüfbe"]);
  const since = encodeURIComponent(both[0]?.receivedAt ?? "");
  expect(await list(`?since=${since}`)).toHaveLength(1);
  expect((await fetch(`${page}/messages.json?since=noon`)).status).toBe(400);
  await endProcess(started, "SIGKILL");
  await start();
  expect(await list()).toEqual(both);
});

it("answers what is not there, what is not allowed, and a foreign name", async () => {
  expect((await fetch(`${page}/messages/1-a.json`)).status).toBe(404);
  expect((await fetch(`${page}/messages/../../etc/passwd`)).status).toBe(404);
  expect((await fetch(page, { method: "POST" })).status).toBe(405);
  expect((await fetch(`${page}/_fake/health`)).status).toBe(200);
  const status = await new Promise((resolve, reject) => {
    request(page, { headers: { Host: "rebound.example" } }, (answer) => {
      answer.resume();
      resolve(answer.statusCode);
    })
      .on("error", reject)
      .end();
  });
  expect(status).toBe(403);
});
