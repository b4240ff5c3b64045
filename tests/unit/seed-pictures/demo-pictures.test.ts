import { createHash } from "node:crypto";
import sharp from "sharp";
import { describe, expect, it } from "vitest";
import { asReceived } from "@/db/seed/pictures/as-received";
import { caseLayer } from "@/db/seed/pictures/case-layer";
import { cleavage } from "@/db/seed/pictures/cleavage";
import { dimples } from "@/db/seed/pictures/dimples";
import { encodePicture } from "@/db/seed/pictures/encode";
import { fractureFace } from "@/db/seed/pictures/fracture-face";
import { fractureOblique } from "@/db/seed/pictures/fracture-oblique";
import { fractureOrigin } from "@/db/seed/pictures/fracture-origin";
import { fretting } from "@/db/seed/pictures/fretting";
import { grainBoundaries } from "@/db/seed/pictures/grain-boundaries";
import { demoPictures } from "@/db/seed/pictures/index";
import { intergranular } from "@/db/seed/pictures/intergranular";
import type { Picture, Size } from "@/db/seed/pictures/picture";
import { pitting } from "@/db/seed/pictures/pitting";
import { springFracture } from "@/db/seed/pictures/round-part-faces";
import { fineStriations, striations } from "@/db/seed/pictures/striations";
import { temperedMartensite } from "@/db/seed/pictures/tempered-martensite";
import { weldToeCrack } from "@/db/seed/pictures/weld-toe-crack";

const SMALL: Size = { width: 240, height: 180 };

const generators: Record<string, (size: Size, seed: number) => Picture> = {
  asReceived,
  caseLayer,
  cleavage,
  dimples,
  fineStriations,
  fractureFace,
  fractureOblique,
  fractureOrigin,
  fretting,
  grainBoundaries,
  intergranular,
  pitting,
  springFracture,
  striations,
  temperedMartensite,
  weldToeCrack,
};

const hash = (picture: Picture) =>
  createHash("sha256").update(new Uint8Array(picture.data.buffer)).digest("hex");

describe.each(Object.entries(generators))("%s", (_name, draw) => {
  it("draws the same picture from the same seed and another from another", () => {
    const first = draw(SMALL, 5);
    expect(first.data).toHaveLength(SMALL.width * SMALL.height * first.channels);
    expect(hash(draw(SMALL, 5))).toBe(hash(first));
    expect(hash(draw(SMALL, 6))).not.toBe(hash(first));
  });

  it("uses a fair part of the range without clipping much of it", () => {
    const { data } = draw(SMALL, 5);
    const white = data instanceof Uint16Array ? 65535 : 255;
    const sorted = Array.from(data).sort((a, b) => a - b);
    const at = (share: number) => sorted[Math.floor(share * (sorted.length - 1))]! / white;
    expect(at(0.98) - at(0.02)).toBeGreaterThan(0.2);
    expect(sorted.filter((value) => value === white).length / sorted.length).toBeLessThan(0.03);
  });
});

describe("pictures of the demonstration", () => {
  it("have names and sizes of their own, one above 40 megapixels", () => {
    const names = demoPictures.map((picture) => picture.fileName);
    expect(new Set(names).size).toBe(names.length);
    const pixels = demoPictures.map(({ size }) => size.width * size.height);
    expect(Math.max(...pixels)).toBeGreaterThan(40e6);
  });

  it("write 16-bit greyscale TIFF with values between the 8-bit steps and the true pixel size", async () => {
    const entry = demoPictures.find(({ fileName }) => fileName === "sem_disc_striations_07.tif")!;
    const { bytes } = await entry.render();
    const meta = await sharp(bytes).metadata();
    expect(meta).toMatchObject({ format: "tiff", depth: "ushort", channels: 1, space: "grey16" });
    expect(meta.density).toBeCloseTo(25.4 / (entry.pixelSizeUm! / 1000), -1);
    const raw = await sharp(bytes).toColourspace("grey16").raw({ depth: "ushort" }).toBuffer();
    const samples = new Uint16Array(raw.buffer, raw.byteOffset, raw.length / 2);
    expect(new Set(samples).size).toBeGreaterThan(5000);
    expect(samples.some((value) => value % 257 !== 0)).toBe(true);
  });

  it("write colour JPEG and grey PNG and TIFF as named, with resolution only where it is stated", async () => {
    const coloured = fretting(SMALL, 1);
    const jpeg = await encodePicture(coloured, { mediaType: "image/jpeg", pixelSizeMm: 0.025 });
    expect(await sharp(jpeg).metadata()).toMatchObject({
      format: "jpeg",
      channels: 3,
      density: 1016,
    });
    const grey = cleavage(SMALL, 1);
    const png = await encodePicture(grey, { mediaType: "image/png" });
    expect(await sharp(png).metadata()).toMatchObject({
      format: "png",
      channels: 1,
      depth: "uchar",
    });
    const tiff = await encodePicture(grey, { mediaType: "image/tiff", pixelSizeMm: 0.0002 });
    const meta = await sharp(tiff).metadata();
    expect(meta).toMatchObject({ format: "tiff", channels: 1, resolutionUnit: "cm" });
    expect(meta.density).toBeCloseTo(127_000, -2);
    const back = await sharp(tiff).toColourspace("b-w").raw().toBuffer();
    expect(back.equals(Buffer.from(grey.data.buffer))).toBe(true);
  });

  it("burn in scale bars that agree with the stated pixel size", async () => {
    const entries = demoPictures.filter(({ fileName }) => fileName.startsWith("sem_"));
    expect(entries.length).toBeGreaterThan(3);
    for (const entry of entries.slice(0, 2)) {
      const { truth } = await entry.render();
      const { from, to, lengthMm } = truth.scaleBar!;
      expect((to.x - from.x) * entry.pixelSizeUm!).toBeCloseTo(lengthMm * 1000, 6);
    }
  });

  it("place the indents of the traverse where their depths say", () => {
    const { truth } = caseLayer({ width: 800, height: 725 }, 1);
    expect(truth.indents).toHaveLength(17);
    for (const indent of truth.indents) {
      expect((indent.centre.y - truth.surface.y) * truth.pixelSizeMm).toBeCloseTo(
        indent.depthMm,
        9,
      );
      expect(indent.centre.y).toBeLessThan(725);
    }
  });
});
