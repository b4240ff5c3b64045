import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { eq } from "drizzle-orm";
import sharp from "sharp";
import { afterAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { images, storedObjects } from "@/db/schema";
import { infoJson, tilePath } from "@/lib/images/iiif";
import { objectStore } from "@/lib/storage/s3";
import { aCase } from "../../helpers/cases";
import { asInvestigator } from "../../helpers/people";
import { sendAndTakeIn } from "../../helpers/send-file";

const folder = mkdtempSync(path.join(tmpdir(), "riverline-pictures-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** Smooth enough that JPEG changes little, and different at every place. */
function samples(width: number, height: number, channels: number, top: number): number[] {
  return Array.from({ length: width * height * channels }, (_, i) => {
    const channel = i % channels;
    const x = Math.floor(i / channels) % width;
    const y = Math.floor(i / channels / width);
    const wave = Math.sin(x / (23 + 9 * channel)) + Math.cos(y / (31 + 7 * channel));
    return Math.round((top / 4) * (2 + wave) * 0.98);
  });
}

type Kind = { name: string; depth: 8 | 16; channels: 1 | 3; perInch: number };
const KINDS: Kind[] = [
  { name: "grey.jpg", depth: 8, channels: 1, perInch: 2540 },
  { name: "colour.jpg", depth: 8, channels: 3, perInch: 600 },
  { name: "grey.png", depth: 8, channels: 1, perInch: 2540 },
  { name: "colour16.png", depth: 16, channels: 3, perInch: 1200 },
  { name: "grey8.tif", depth: 8, channels: 1, perInch: 25_400 },
  { name: "grey16.tif", depth: 16, channels: 1, perInch: 5080 },
  { name: "colour8.tif", depth: 8, channels: 3, perInch: 2540 },
  { name: "colour16.tif", depth: 16, channels: 3, perInch: 1270 },
];
const [WIDTH, HEIGHT] = [1301, 777];

async function fileOf({ name, depth, channels, perInch }: Kind): Promise<Buffer> {
  const values = samples(WIDTH, HEIGHT, channels, depth === 16 ? 60_000 : 250);
  const raw = depth === 16 ? Uint16Array.from(values) : Uint8Array.from(values);
  const space =
    channels === 1 ? (depth === 16 ? "grey16" : "b-w") : depth === 16 ? "rgb16" : "srgb";
  const picture = sharp(raw, { raw: { width: WIDTH, height: HEIGHT, channels } })
    .toColourspace(space)
    .withDensity(perInch);
  if (name.endsWith(".jpg")) {
    return picture.jpeg({ quality: 95, chromaSubsampling: "4:4:4" }).toBuffer();
  }
  if (name.endsWith(".png")) return picture.png().toBuffer();
  return picture
    .tiff({ compression: "lzw", xres: perInch / 25.4, yres: perInch / 25.4 })
    .toBuffer();
}

/** What Debian's ImageMagick says of a file: width, height, bits a sample, resolution, its unit. */
function identify(file: string) {
  const line = execFileSync("identify", ["-format", "%w %h %z %x %y %U", file]).toString();
  const [width, height, depth, x, y, unit] = line.split(" ");
  const perInch = (value: string | undefined) =>
    Number(value) * (unit === "PixelsPerCentimeter" ? 2.54 : 1);
  return {
    width: Number(width),
    height: Number(height),
    depth: Number(depth),
    umPerPxX: 25_400 / perInch(x),
    umPerPxY: 25_400 / perInch(y),
  };
}

/** What exiftool says of the same. */
function exiftool(file: string) {
  const [said] = JSON.parse(
    execFileSync("exiftool", ["-json", "-n", "-ImageWidth", "-ImageHeight", file]).toString(),
  ) as { ImageWidth: number; ImageHeight: number }[];
  return said;
}

async function takenIn(fileName: string, bytes: Buffer) {
  const upload = await sendAndTakeIn(await asInvestigator(), {
    caseId: await aCase(),
    fileName,
    bytes,
  });
  expect(upload).toMatchObject({ state: "taken", refusal: null });
  const [image] = await database()
    .select()
    .from(images)
    .where(eq(images.recordId, upload.imageId ?? ""));
  if (!image) throw new Error("no picture was made");
  return { upload, image };
}

/** Full-size tiles of a pyramid, put together again. */
async function reassembled(image: typeof images.$inferSelect): Promise<Buffer> {
  const [width, height] = [image.widthPx ?? 0, image.heightPx ?? 0];
  const tiles: { input: Buffer; left: number; top: number }[] = [];
  for (let top = 0; top < height; top += 512) {
    for (let left = 0; left < width; left += 512) {
      const size = `${Math.min(512, width - left)},${Math.min(512, height - top)}`;
      const key = `${image.tilePrefix}/${left},${top},${size}/${size}/0/default.jpg`;
      const input = await objectStore().getBytes(key);
      const { width: w, height: h } = await sharp(input).metadata();
      expect(`${w},${h}`).toBe(size);
      tiles.push({ input, left, top });
    }
  }
  return sharp({ create: { width, height, channels: 3, background: "#f0f" } })
    .composite(tiles)
    .removeAlpha()
    .toColourspace("srgb")
    .raw()
    .toBuffer();
}

describe("a picture on its way in", () => {
  it.each(KINDS)(
    "$name: size, depth and resolution as outside programs read them",
    async (kind) => {
      const bytes = await fileOf(kind);
      const file = path.join(folder, kind.name);
      writeFileSync(file, bytes);
      const outside = identify(file);
      const { image } = await takenIn(kind.name, bytes);
      expect(image.widthPx).toBe(outside.width);
      expect(image.heightPx).toBe(outside.height);
      expect(exiftool(file)).toMatchObject({
        ImageWidth: image.widthPx,
        ImageHeight: image.heightPx,
      });
      expect(image.bitDepth).toBe(outside.depth);
      expect(image.channels).toBe(kind.channels);
      expect(image.fileUmPerPxX).toBeCloseTo(outside.umPerPxX, 2);
      expect(image.fileUmPerPxY).toBeCloseTo(outside.umPerPxY, 2);
      expect(image.fileUmPerPxX).toBeCloseTo(25_400 / kind.perInch, 2);
    },
  );

  it("keeps the original byte for byte", async () => {
    const bytes = await fileOf({ name: "grey16.tif", depth: 16, channels: 1, perInch: 2540 });
    const { image, upload } = await takenIn("face.tif", bytes);
    const [object] = await database()
      .select()
      .from(storedObjects)
      .where(eq(storedObjects.id, image.objectId));
    expect(object).toMatchObject({ fileName: "face.tif", mediaType: "image/tiff" });
    expect(Buffer.compare(await objectStore().getBytes(object?.key ?? ""), bytes)).toBe(0);
    expect(await objectStore().head(upload.key)).toBeNull();
  });

  it.each(KINDS.filter((kind) => kind.depth === 8))(
    "$name: the tiles put together are the original",
    async (kind) => {
      const bytes = await fileOf(kind);
      const { image } = await takenIn(kind.name, bytes);
      const tiles = await reassembled(image);
      const original = await sharp(bytes).toColourspace("srgb").removeAlpha().raw().toBuffer({
        resolveWithObject: true,
      });
      const step = original.info.channels;
      let most = 0;
      for (let pixel = 0; pixel < WIDTH * HEIGHT; pixel += 1) {
        for (let channel = 0; channel < 3; channel += 1) {
          const was = original.data[pixel * step + (step === 1 ? 0 : channel)] ?? 0;
          most = Math.max(most, Math.abs(was - (tiles[pixel * 3 + channel] ?? 0)));
        }
      }
      // JPEG of quality 85 on a smooth picture; a tile in the wrong place would differ by tens.
      expect(most).toBeLessThanOrEqual(8);
    },
  );

  it("shows 16 bits through a window that is written down, and leaves the original alone", async () => {
    const values = samples(WIDTH, HEIGHT, 1, 2000).map((value) => value + 1000);
    const bytes = await sharp(Uint16Array.from(values), {
      raw: { width: WIDTH, height: HEIGHT, channels: 1 },
    })
      .toColourspace("grey16")
      .tiff({ compression: "none" })
      .toBuffer();
    const { image } = await takenIn("dim.tif", bytes);
    const window = image.metadata?.shownWindow as { black: number; white: number };
    const sorted = values.toSorted((a, b) => a - b);
    expect(Math.abs(window.black - (sorted[0] ?? 0))).toBeLessThan(60);
    expect(Math.abs(window.white - (sorted.at(-1) ?? 0))).toBeLessThan(60);
    const tiles = await reassembled(image);
    let most = 0;
    for (const [pixel, value] of values.entries()) {
      const expected = (255 * (value - window.black)) / (window.white - window.black);
      const shown = Math.min(255, Math.max(0, expected));
      most = Math.max(most, Math.abs(shown - (tiles[pixel * 3] ?? 0)));
    }
    expect(most).toBeLessThanOrEqual(8);
  });

  it.each([
    [1, 1],
    [300, 200],
    [512, 512],
    [513, 40],
    [1025, 1024],
    [2049, 700],
  ])("makes every tile that a viewer asks for: %i × %i", async (width, height) => {
    const bytes = await sharp({ create: { width, height, channels: 3, background: "#789" } })
      .png()
      .toBuffer();
    const { image } = await takenIn("plain.png", bytes);
    const shape = { widthPx: width, heightPx: height, scaleFactors: image.scaleFactors ?? [] };
    expect(infoJson("https://lab.example/i", shape)).toMatchObject({
      "@context": "http://iiif.io/api/image/3/context.json",
      id: "https://lab.example/i",
      type: "ImageService3",
      protocol: "http://iiif.io/api/image",
      profile: "level0",
      width,
      height,
      tiles: [{ width: 512, scaleFactors: image.scaleFactors }],
    });
    // Tile requests of the IIIF Image API 3.0 implementation notes, at every scale.
    for (const factor of shape.scaleFactors) {
      const step = 512 * factor;
      for (let y = 0; y < height; y += step) {
        for (let x = 0; x < width; x += step) {
          const [w, h] = [Math.min(step, width - x), Math.min(step, height - y)];
          const isWhole = w === width && h === height;
          const region = isWhole ? "full" : `${x},${y},${w},${h}`;
          const asked = `${region}/${Math.ceil(w / factor)},${Math.ceil(h / factor)}/0/default.jpg`;
          const stored = tilePath(asked, shape);
          expect(stored).toBe(asked);
          const tile = await objectStore().head(`${image.tilePrefix}/${stored}`);
          expect(tile?.mediaType, asked).toBe("image/jpeg");
        }
      }
    }
    const thumbnail = await sharp(
      await objectStore().getBytes(`${image.tilePrefix}/thumbnail.jpg`),
    ).metadata();
    const longer = Math.max(thumbnail.width, thumbnail.height);
    expect(longer).toBeLessThanOrEqual(320);
    expect(longer).toBeGreaterThanOrEqual(Math.min(256, Math.max(width, height)));
  });

  it("shows a picture upright when the camera wrote that it was turned", async () => {
    const bytes = await sharp({
      create: { width: 60, height: 20, channels: 3, background: "#abc" },
    })
      .withMetadata({ orientation: 6 })
      .jpeg()
      .toBuffer();
    const { image } = await takenIn("turned.jpg", bytes);
    expect([image.widthPx, image.heightPx]).toEqual([20, 60]);
  });

  it("shows the largest page of a file with several", async () => {
    const pages = path.join(folder, "pages.tif");
    const page = (width: number) => ["(", "-size", `${width}x40`, "xc:gray50", ")"];
    execFileSync("convert", [...page(50), ...page(90), ...page(70), pages]);
    const { image } = await takenIn("pages.tif", readFileSync(pages));
    expect([image.widthPx, image.heightPx]).toEqual([90, 40]);
    expect(image.metadata).toMatchObject({ page: 2, pages: 3 });
  });

  it.each([72, 96])(
    "takes %i dots per inch for a habit, and keeps what was said",
    async (perInch) => {
      const bytes = await sharp({
        create: { width: 8, height: 8, channels: 3, background: "#abc" },
      })
        .withDensity(perInch)
        .jpeg()
        .toBuffer();
      const { image } = await takenIn("habit.jpg", bytes);
      expect(image.fileUmPerPxX).toBeNull();
      expect(image.metadata?.resolution).toMatchObject({ x: perInch, unit: "inch" });
    },
  );

  it("reads date and instrument where the file has them", async () => {
    const file = path.join(folder, "dated.jpg");
    await sharp({ create: { width: 8, height: 8, channels: 3, background: "#abc" } })
      .jpeg()
      .toFile(file);
    execFileSync("exiftool", [
      "-q",
      "-overwrite_original",
      "-DateTimeOriginal=2026:11:20 09:10:11",
      "-Make=Calder",
      "-Model=Bench camera 4",
      file,
    ]);
    const { image } = await takenIn("dated.jpg", readFileSync(file));
    expect(image.metadata).toMatchObject({ instrument: "Calder Bench camera 4" });
  });
});
