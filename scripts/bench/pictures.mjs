import { readFileSync } from "node:fs";
import { rm } from "node:fs/promises";
import path from "node:path";
import sharp from "sharp";
import { findCommand } from "../lib/commands.mjs";
import { projectScript } from "../lib/project-script.mjs";
import { root } from "../lib/root.mjs";
import { inPairs, timeOf } from "./measure.mjs";
import { makePicture, sendPicture, untilTaken } from "./send-picture.mjs";
import { measureTile } from "./tile.mjs";

/** As the worker writes them: `lib/images/tile-pyramid.ts`. */
const LIKE_THE_WORKER = [
  ...["--layout", "iiif3", "--tile-size", "512"],
  ...["--suffix", ".jpg[Q=85,subsample-mode=off]"],
];

/** Most memory a process has held so far, in MB. */
function peakMb(pid) {
  const status = readFileSync(`/proc/${pid}/status`, "utf8");
  return Number(/^VmHWM:\s+(\d+) kB$/m.exec(status)?.[1]) / 1024;
}

async function dzsave(children, file, folder, threads) {
  const tiles = path.join(folder, "vips-tiles");
  await rm(tiles, { recursive: true, force: true });
  return timeOf(() =>
    children.run({
      name: "vips",
      command: findCommand("vips"),
      args: ["dzsave", file, tiles, ...LIKE_THE_WORKER],
      env: { VIPS_CONCURRENCY: String(threads) },
      explain: "Making tiles with vips",
    }),
  );
}

/**
 * A TIFF of 100 megapixels through the worker's job against libvips' own command on the same file,
 * and then one tile of it through the portal.
 * @returns the rows, and the most memory the worker held in MB
 */
export async function measurePictures(children, portal) {
  const { folder } = children;
  const file = await makePicture(folder);
  const worker = children.start({
    name: "worker",
    ...projectScript("scripts/worker.ts"),
    cwd: root,
    env: portal.settings,
  });
  // The worker sets no number of threads: its picture package chooses, here as there.
  const threads = sharp.concurrency();
  let picture;
  const job = async () => {
    const { uploadId, queuedAt } = await sendPicture(portal, file);
    picture = { uploadId, imageId: await untilTaken(portal, uploadId) };
    return performance.now() - queuedAt;
  };
  const found = await inPairs(
    { product: job, yardstick: () => dzsave(children, file, folder, threads) },
    { pairs: 3, warmUps: 1 },
  );
  const workerPeakMb = peakMb(worker.child.pid);
  await children.stop(worker);
  const row = {
    letter: "a",
    what: "taking in a TIFF of 100 megapixels: the worker's whole job, with its wait in the queue",
    against: `vips dzsave: same file, tiles, quality and number of threads (${threads})`,
    ...found,
  };
  return { rows: [row, await measureTile(portal, picture)], workerPeakMb };
}
