import type { AddressInfo } from "node:net";
import { type ParsedMail, simpleParser } from "mailparser";
import { SMTPServer, type SMTPServerSession } from "smtp-server";

export type Arrived = { recipients: string[]; mail: ParsedMail; source: string };
export type Relay = { port: number; arrived: Arrived[]; close(): Promise<void> };

/** A mail relay on this machine; it answers with `refusal` instead of taking a message. */
export async function startRelay(
  how: { port?: number; refusal?: () => { code: number; says: string } | null } = {},
): Promise<Relay> {
  const arrived: Arrived[] = [];
  const server = new SMTPServer({
    authOptional: true,
    closeTimeout: 100,
    disabledCommands: ["STARTTLS", "AUTH"],
    onData(stream, session, done) {
      const chunks: Buffer[] = [];
      stream.on("data", (chunk: Buffer) => chunks.push(chunk));
      stream.on("end", () => {
        const refused = how.refusal?.() ?? null;
        if (refused) {
          done(Object.assign(new Error(refused.says), { responseCode: refused.code }));
          return;
        }
        keep(session, Buffer.concat(chunks)).then(() => done(), done);
      });
    },
  });
  async function keep(session: SMTPServerSession, bytes: Buffer) {
    arrived.push({
      recipients: session.envelope.rcptTo.map(({ address }) => address),
      mail: await simpleParser(bytes),
      source: bytes.toString("latin1"),
    });
  }
  await new Promise<void>((resolve, reject) => {
    server.once("error", reject);
    server.listen(how.port ?? 0, "127.0.0.1", resolve);
  });
  const { port } = server.server.address() as AddressInfo;
  return {
    port,
    arrived,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
