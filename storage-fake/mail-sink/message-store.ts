import { randomUUID } from "node:crypto";
import { mkdir, open, readFile, readdir, rename, rm } from "node:fs/promises";
import path from "node:path";
import { type ParsedMail, simpleParser } from "mailparser";

/** What a list needs to know of a message; written beside it when it arrives. */
export interface MessageSummary {
  id: string;
  /** ISO 8601, UTC. */
  receivedAt: string;
  /** Envelope addresses: who really would have got it, hidden copies included. */
  envelopeFrom: string;
  envelopeTo: string[];
  /** Header as written, with names. */
  from: string;
  to: string;
  subject: string;
  sizeBytes: number;
}

export interface MessageFilter {
  /** Part of an envelope address, in any case. */
  to?: string;
  /** ISO 8601: only messages received at this moment or later. */
  since?: string;
}

function headerText(address: ParsedMail["to"]): string {
  const list = address === undefined ? [] : [address].flat();
  return list.map((each) => each.text).join(", ");
}

async function writeFlushed(file: string, temporary: string, content: Buffer | string) {
  const handle = await open(temporary, "w");
  try {
    await handle.writeFile(content);
    await handle.sync();
  } finally {
    await handle.close();
  }
  await rename(temporary, file);
}

/** Messages as `ID.eml` with a summary `ID.json` beside each, all in one folder. */
export class MessageStore {
  private readonly summaries = new Map<string, MessageSummary>();

  private constructor(private readonly folder: string) {}

  /** Opens or creates the folder. A message without its summary was never acknowledged: removed. */
  static async open(folder: string): Promise<MessageStore> {
    await mkdir(folder, { recursive: true });
    const store = new MessageStore(folder);
    const names = await readdir(folder);
    for (const name of names.filter((each) => each.endsWith(".json")).sort()) {
      const text = await readFile(path.join(folder, name), "utf8");
      const summary = JSON.parse(text) as MessageSummary;
      store.summaries.set(summary.id, summary);
    }
    for (const name of names) {
      const { name: id, ext } = path.parse(name);
      if (ext === ".part" || (ext === ".eml" && !store.summaries.has(id))) {
        await rm(path.join(folder, name), { force: true });
      }
    }
    return store;
  }

  /** Keeps a message; when this returns it is on the disk. */
  async add(source: Buffer, envelopeFrom: string, envelopeTo: string[]): Promise<MessageSummary> {
    const mail = await simpleParser(source);
    const receivedAt = new Date().toISOString();
    const id = `${receivedAt.replace(/[^0-9]/g, "")}-${randomUUID().slice(0, 8)}`;
    const summary: MessageSummary = {
      id,
      receivedAt,
      envelopeFrom,
      envelopeTo,
      from: headerText(mail.from),
      to: headerText(mail.to),
      subject: mail.subject ?? "",
      sizeBytes: source.length,
    };
    const base = path.join(this.folder, id);
    await writeFlushed(`${base}.eml`, `${base}.eml.part`, source);
    await writeFlushed(`${base}.json`, `${base}.json.part`, JSON.stringify(summary));
    this.summaries.set(id, summary);
    return summary;
  }

  /** Newest first. */
  list({ to, since }: MessageFilter = {}): MessageSummary[] {
    const wanted = to?.trim().toLowerCase() ?? "";
    const from = since === undefined ? -Infinity : Date.parse(since);
    return [...this.summaries.values()]
      .filter((each) => each.envelopeTo.some((one) => one.toLowerCase().includes(wanted)))
      .filter((each) => Date.parse(each.receivedAt) >= from)
      .reverse();
  }

  summary(id: string): MessageSummary | undefined {
    return this.summaries.get(id);
  }

  /** The message as it came, headers and all. Ask `summary` first. */
  async source(summary: MessageSummary): Promise<Buffer> {
    return readFile(path.join(this.folder, `${summary.id}.eml`));
  }
}
