import path from "node:path";
import { databaseUser, ensureAccount, ensureDataFolder, startDatabase } from "./mariadb.mjs";
import { answersOn } from "./ports.mjs";
import { projectScript } from "./project-script.mjs";

/** MariaDB on loopback with the application's schema and account. */
export async function startLocalDatabase({ folder, secrets, ports, children, options }) {
  const user = await databaseUser(children);
  const data = await ensureDataFolder(folder, user, children);
  const entry = await startDatabase({
    folder,
    data,
    user,
    port: ports.database,
    children,
    options,
  });
  children.guard(entry, "The database");
  ensureAccount(data, {
    schema: "riverline",
    account: "riverline",
    password: secrets.databasePassword,
  });
  return data;
}

/** The object store that stands in for an S3 service. */
export async function startLocalStore({ root, folder, ports, settings, children }) {
  const store = path.join(folder, "objects");
  const entry = children.start({
    name: "store",
    ...projectScript("storage-fake/main.ts", ["--folder", store, "--port", String(ports.store)]),
    cwd: root,
    env: settings,
  });
  await children.waitUntilReady(entry, () => answersOn(ports.store), {
    seconds: 30,
    what: "The object store",
  });
  children.guard(entry, "The object store");
  await children.run({
    name: "store-bucket",
    ...projectScript("scripts/prepare-store.ts"),
    cwd: root,
    env: settings,
    explain: "Making the bucket in the object store",
  });
}

/** The mail sink that stands in for a mail relay; its messages are read at a local page. */
export async function startLocalMail({ root, folder, ports, settings, children }) {
  const args = ["--folder", path.join(folder, "mail")];
  args.push("--smtp-port", String(ports.smtp), "--http-port", String(ports.mailPage));
  const entry = children.start({
    name: "mail",
    ...projectScript("storage-fake/mail-sink/main.ts", args),
    cwd: root,
    env: settings,
  });
  const ready = async () => (await answersOn(ports.smtp)) && (await answersOn(ports.mailPage));
  await children.waitUntilReady(entry, ready, { seconds: 30, what: "The mail sink" });
  children.guard(entry, "The mail sink");
}
