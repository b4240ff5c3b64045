import { spawnSync } from "node:child_process";
import { chownSync, chmodSync, existsSync, mkdirSync, renameSync, rmSync } from "node:fs";
import { userInfo } from "node:os";
import path from "node:path";
import { findCommand } from "./commands.mjs";
import { Failure } from "./report.mjs";

const SYSTEM_USER = "riverline-db";
const SOCKET = "riverline.sock";

function readId(flag, user) {
  const result = spawnSync("id", [flag, user], { encoding: "utf8" });
  return result.status === 0 ? Number(result.stdout.trim()) : undefined;
}

/** The unprivileged user under which root runs the daemon; nobody else needs another user. */
export async function databaseUser(children) {
  if (process.getuid() !== 0) return undefined;
  if (readId("-u", SYSTEM_USER) === undefined) {
    await children.run({
      name: "useradd",
      command: findCommand("useradd"),
      args: ["--system", "--no-create-home", "--shell", "/usr/sbin/nologin", SYSTEM_USER],
      explain: `Making the system user ${SYSTEM_USER}`,
    });
  }
  return { name: SYSTEM_USER, uid: readId("-u", SYSTEM_USER), gid: readId("-g", SYSTEM_USER) };
}

/** The state folder stays closed to others; the daemon's group may only pass through it. */
function letThrough(folder, user) {
  chownSync(folder, 0, user.gid);
  chmodSync(folder, 0o710);
  const reach = ["--reuid", user.name, "--regid", user.name, "--clear-groups", "--"];
  const result = spawnSync("setpriv", [...reach, "test", "-x", folder]);
  if (result.status === 0) return;
  throw new Failure(
    `The system user ${user.name}, which runs the database, may not enter ${folder}.`,
    "A folder above it is closed to other users. Set RIVERLINE_STATE to a folder under /var/lib, " +
      "or open the folders above it for passing (chmod o+x).",
    "Nothing was changed.",
  );
}

/** Makes the data folder in one move, so that a start that was cut short leaves none behind. */
export async function ensureDataFolder(folder, user, children) {
  if (user) letThrough(folder, user);
  const data = path.join(folder, "mysql");
  const unfinished = path.join(folder, "mysql.unfinished");
  rmSync(unfinished, { recursive: true, force: true });
  if (existsSync(data)) return data;
  mkdirSync(unfinished, { mode: 0o700 });
  if (user) chownSync(unfinished, user.uid, user.gid);
  await children.run({
    name: "database-install",
    command: findCommand("mariadb-install-db"),
    args: [
      "--no-defaults",
      `--datadir=${unfinished}`,
      // The administrator comes in through the socket as this user of the machine, never by TCP.
      "--auth-root-authentication-method=socket",
      `--auth-root-socket-user=${userInfo().username}`,
      "--skip-test-db",
      ...(user ? [`--user=${user.name}`] : []),
    ],
    explain: "Making the database's data folder",
  });
  renameSync(unfinished, data);
  return data;
}

/** Starts the daemon on loopback and waits until it answers on its socket. */
export async function startDatabase({ folder, data, user, port, children, options = [] }) {
  const entry = children.start({
    name: "database",
    command: findCommand("mariadbd"),
    args: [
      "--no-defaults",
      `--datadir=${data}`,
      // Relative to the data folder: the path of a socket may not be longer than 107 bytes.
      `--socket=${SOCKET}`,
      "--bind-address=127.0.0.1",
      `--port=${port}`,
      "--skip-name-resolve",
      "--local-infile=0",
      "--character-set-server=utf8mb4",
      "--collation-server=utf8mb4_unicode_520_ci",
      "--default-time-zone=+00:00",
      "--innodb-buffer-pool-size=256M",
      "--max-allowed-packet=64M",
      "--performance-schema=OFF",
      ...options,
    ],
    cwd: folder,
    user,
  });
  await children.waitUntilReady(entry, () => ask(data, "select 1").status === 0, {
    seconds: 120,
    what: "The database",
  });
  return entry;
}

function ask(data, sql) {
  const args = ["--no-defaults", `--socket=${SOCKET}`, "--batch", "--skip-column-names"];
  return spawnSync(findCommand("mariadb"), args, {
    cwd: data,
    input: sql,
    encoding: "utf8",
    timeout: 60_000,
  });
}

/** Runs statements as the database's administrator. */
export function administer(data, sql) {
  const result = ask(data, sql);
  if (result.status === 0) return result.stdout;
  throw new Failure(`The database refused a statement: ${result.stderr?.trim() ?? result.error}`);
}

/** Creates the application's schema and account; harmless when both are there. */
export function ensureAccount(data, { schema, account, password, grantOn = schema }) {
  administer(
    data,
    `create database if not exists \`${schema}\`;
     create user if not exists '${account}'@'127.0.0.1' identified by '${password}';
     alter user '${account}'@'127.0.0.1' identified by '${password}';
     grant all on \`${grantOn}\`.* to '${account}'@'127.0.0.1';`,
  );
}
