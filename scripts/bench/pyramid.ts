import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import sharp from "sharp";
import { readPicture } from "@/lib/images/read-picture";
import { writePyramid } from "@/lib/images/tile-pyramid";
import { type Measured, medianMs } from "./measure";

const SIDE_PX = 6_000;
const FEW = { runs: 5, warmUps: 1 };

/** Tiles of a 36 megapixel JPEG of noise, the hardest picture there is to compress. */
export async function benchPyramid(): Promise<Measured> {
  const folder = await mkdtemp(path.join(tmpdir(), "riverline-bench-"));
  try {
    const file = path.join(folder, "picture.jpg");
    await sharp({
      create: {
        width: SIDE_PX,
        height: SIDE_PX,
        channels: 3,
        background: "#808080",
        noise: { type: "gaussian", mean: 128, sigma: 40 },
      },
    })
      .jpeg()
      .toFile(file);
    const head = await readPicture(file, "picture.jpg");
    let run = 0;
    const ms = await medianMs(() => writePyramid(file, head, path.join(folder, `${run++}`)), FEW);
    const yardstickMs = await medianMs(
      () => sharp(file).jpeg({ quality: 85 }).toFile(path.join(folder, "again.jpg")),
      FEW,
    );
    return {
      what: "Tile pyramid of a 36 megapixel picture",
      ms,
      yardstick: "sharp writing the same picture once as one JPEG",
      yardstickMs,
    };
  } finally {
    await rm(folder, { recursive: true });
  }
}
