import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from "smtp-server";
import type { MessageStore } from "./message-store";

const MAX_MESSAGE_BYTES = 32 * 1024 ** 2;

async function receive(
  store: MessageStore,
  stream: SMTPServerDataStream,
  session: SMTPServerSession,
): Promise<void> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of stream as AsyncIterable<Buffer>) {
    size += chunk.length;
    if (size <= MAX_MESSAGE_BYTES) chunks.push(chunk);
  }
  if (size > MAX_MESSAGE_BYTES) {
    throw Object.assign(new Error("The message is larger than 32 MiB."), { responseCode: 552 });
  }
  const { mailFrom, rcptTo } = session.envelope;
  const to = rcptTo.map(({ address }) => address);
  await store.add(Buffer.concat(chunks), mailFrom ? mailFrom.address : "", to);
}

/** Takes every message from anyone, without sign-in or TLS, and passes none on. */
export function createSmtpSink(store: MessageStore): SMTPServer {
  const sink = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    disableReverseLookup: true,
    banner: "mail sink, nothing is sent on",
    size: MAX_MESSAGE_BYTES,
    onData(stream, session, callback) {
      receive(store, stream, session).then(
        () => callback(),
        (error: unknown) => {
          const cause = error instanceof Error ? error : new Error(String(error));
          console.error(cause);
          callback(Object.assign(cause, "responseCode" in cause ? {} : { responseCode: 451 }));
        },
      );
    },
  });
  // A client that breaks off is no reason to stop taking mail.
  sink.on("error", (error) => console.error(`SMTP: ${error.message}`));
  return sink;
}
