import { parseArgs } from "node:util";
import { addressOf, closeOnSignal, listen } from "../listening";
import { createMessagePageServer } from "./message-page-server";
import { MessageStore } from "./message-store";
import { createSmtpSink } from "./smtp";

const HOST = "127.0.0.1";

const { values } = parseArgs({
  options: {
    folder: { type: "string" },
    "smtp-port": { type: "string", default: "0" },
    "http-port": { type: "string", default: "0" },
  },
});

if (!values.folder) {
  console.error("The mail sink did not start. It needs --folder DIR.");
  process.exit(2);
}

try {
  const store = await MessageStore.open(values.folder);
  const smtp = createSmtpSink(store);
  const pages = createMessagePageServer(store);
  await listen(smtp.server, HOST, values["smtp-port"]);
  const pageAddress = await listen(pages, HOST, values["http-port"]);
  closeOnSignal([smtp, pages]);
  const smtpAddress = addressOf(smtp.server).replace("http:", "smtp:");
  console.log(`mail sink ready on ${smtpAddress} with its page on ${pageAddress}`);
} catch (error) {
  console.error(
    `The mail sink did not start. ${error instanceof Error ? error.message : String(error)}`,
  );
  process.exit(1);
}
