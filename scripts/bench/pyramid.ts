import { execFile } from "node:child_process";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { promisify } from "node:util";
import sharp from "sharp";
import { TILE_SIZE_PX } from "@/lib/images/constants";
import { readPicture } from "@/lib/images/read-picture";
import { writePyramid } from "@/lib/images/tile-pyramid";
import { type Measured, medianMs } from "./measure";

const SIDE_PX = 10_000;
const FEW = { runs: 3, warmUps: 1 };
const run = promisify(execFile);

/** Tiles of a 100 megapixel TIFF of noise, the hardest picture there is to compress. */
export async function benchPyramid(): Promise<Measured> {
  const folder = await mkdtemp(path.join(tmpdir(), "riverline-bench-"));
  try {
    const file = path.join(folder, "picture.tif");
    await sharp({
      create: {
        width: SIDE_PX,
        height: SIDE_PX,
        channels: 3,
        background: "#808080",
        noise: { type: "gaussian", mean: 128, sigma: 40 },
      },
    })
      .tiff({ compression: "none" })
      .toFile(file);
    const head = await readPicture(file, "picture.tif");
    let count = 0;
    const next = () => path.join(folder, `tiles-${count++}`);
    const ms = await medianMs(() => writePyramid(file, head, next()), FEW);
    const env = { ...process.env, VIPS_CONCURRENCY: String(sharp.concurrency()) };
    const options = ["--layout", "iiif3", "--tile-size", String(TILE_SIZE_PX)];
    const suffix = ["--suffix", ".jpg[Q=85,subsample-mode=off]"];
    const yardstickMs = await medianMs(
      () => run("vips", ["dzsave", file, next(), ...options, ...suffix], { env }),
      FEW,
    );
    const peakMb = process.resourceUsage().maxRSS / 1024;
    return {
      what: `Tile pyramid of a 100 megapixel TIFF (peak memory of the process ${peakMb.toFixed(0)} MB)`,
      ms,
      yardstick: "vips dzsave on the same file with as many threads",
      yardstickMs,
    };
  } finally {
    await rm(folder, { recursive: true });
  }
}
