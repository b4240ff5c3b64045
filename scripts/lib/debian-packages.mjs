import { spawnSync } from "node:child_process";
import { findCommand } from "./commands.mjs";
import { Failure, step } from "./report.mjs";

/** Debian package for each program that may be missing. */
const PACKAGE_OF = {
  mariadbd: "mariadb-server-core",
  "mariadb-install-db": "mariadb-server-core",
  mariadb: "mariadb-client-core",
  setpriv: "util-linux",
  useradd: "passwd",
  chromium: "chromium",
  pdfinfo: "poppler-utils",
  pdftotext: "poppler-utils",
  identify: "imagemagick",
  exiftool: "libimage-exiftool-perl",
  vips: "libvips-tools",
};

export function missingPackages(commands) {
  const missing = commands.filter((command) => findCommand(command) === undefined);
  return [...new Set(missing.map((command) => PACKAGE_OF[command]))];
}

const APT = ["-o", "DPkg::Lock::Timeout=300", "-o", "Dpkg::Use-Pty=0"];

/** Installs the Debian packages of the named programs when a program is missing. */
export async function ensureCommands(commands, children) {
  const packages = missingPackages(commands);
  if (packages.length === 0) return;
  const byHand = `apt-get update && apt-get install -y --no-install-recommends ${packages.join(" ")}`;
  const prefix = rightToInstall(byHand);
  await step(`Installing Debian packages: ${packages.join(", ")}`, async () => {
    const run = (args) =>
      children.run({
        name: "apt",
        command: prefix[0] ?? "apt-get",
        args: [...prefix.slice(1), ...(prefix.length > 0 ? ["apt-get"] : []), ...APT, ...args],
        env: { DEBIAN_FRONTEND: "noninteractive" },
        explain: "Installing Debian packages",
      });
    await run(["update", "-qq"]);
    await run(["install", "-y", "-qq", "--no-install-recommends", ...packages]);
  });
  const still = missingPackages(commands);
  if (still.length > 0) throw needsPackages(still, `apt-get install -y ${still.join(" ")}`);
}

/** The words to put before apt-get: none for root, sudo where it does not ask for a password. */
function rightToInstall(byHand) {
  if (findCommand("apt-get") === undefined) throw needsPackages([], byHand);
  if (process.getuid() === 0) return [];
  const sudo = findCommand("sudo");
  if (sudo && spawnSync(sudo, ["-n", "true"], { stdio: "ignore" }).status === 0) {
    return [sudo, "-n"];
  }
  throw new Failure(
    "Programs that Riverline needs are not installed, and this user may not install them.",
    `Run this once as root, then start again:\n\n    ${byHand}\n`,
    "Nothing was changed.",
  );
}

function needsPackages(packages, byHand) {
  return new Failure(
    `Programs that Riverline needs are not installed${packages.length ? `: ${packages.join(", ")}` : ""}.`,
    `Install them with this machine's package manager; on Debian:\n\n    ${byHand}\n`,
  );
}
