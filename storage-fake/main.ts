import { mkdir } from "node:fs/promises";
import { parseArgs } from "node:util";
import { closeOnSignal, listen } from "./listening";
import { lockFolder } from "./object-store/folder-lock";
import { createObjectStoreServer } from "./object-store/server";
import { Store } from "./object-store/store";

const { values } = parseArgs({
  options: {
    folder: { type: "string" },
    port: { type: "string", default: "0" },
    host: { type: "string", default: "127.0.0.1" },
  },
});
const accessKeyId = process.env.S3_ACCESS_KEY_ID;
const secretAccessKey = process.env.S3_SECRET_ACCESS_KEY;

if (!values.folder || !accessKeyId || !secretAccessKey) {
  console.error(
    "The object store did not start. It needs --folder DIR and the environment variables " +
      "S3_ACCESS_KEY_ID and S3_SECRET_ACCESS_KEY.",
  );
  process.exit(2);
}

try {
  await mkdir(values.folder, { recursive: true });
  await lockFolder(values.folder);
  const store = await Store.open(values.folder);
  const server = createObjectStoreServer(store, { accessKeyId, secretAccessKey });
  const address = await listen(server, values.host, values.port);
  closeOnSignal([server]);
  console.log(`object store ready on ${address}`);
} catch (error) {
  console.error(
    `The object store did not start. ${error instanceof Error ? error.message : String(error)}`,
  );
  process.exit(1);
}
