/** How a file states its resolution, as its tags say it. */
export type StatedResolution = {
  x: number;
  y: number;
  /** null where the file gives only a shape of pixel, without a length. */
  unit: "inch" | "cm" | "m" | null;
};

const UM_PER_UNIT = { inch: 25_400, cm: 10_000, m: 1_000_000 } as const;

/** Dots per inch that programs write when they know nothing; they say nothing about the object. */
const MEANINGLESS_PER_INCH = [72, 96];
/** Smallest and largest pixel that a picture of a part can have, µm. */
const PLAUSIBLE_UM = { least: 1e-4, most: 5_000 };

/**
 * µm per pixel that a file's resolution stands for, across and down: a proposal that a person has to
 * confirm. Null when the file states none, or one that programs write by habit.
 */
export function umPerPxFrom(stated: StatedResolution | null): { x: number; y: number } | null {
  if (!stated || stated.unit === null) return null;
  const um = UM_PER_UNIT[stated.unit];
  const size = { x: um / stated.x, y: um / stated.y };
  const isHabit = MEANINGLESS_PER_INCH.some(
    (perInch) => Math.abs(UM_PER_UNIT.inch / size.x - perInch) < 0.5,
  );
  const isPlausible = [size.x, size.y].every(
    (value) => Number.isFinite(value) && value >= PLAUSIBLE_UM.least && value <= PLAUSIBLE_UM.most,
  );
  return isPlausible && !isHabit ? size : null;
}

/** Resolution in a TIFF's or EXIF's tags: ResolutionUnit 1 none, 2 inch, 3 cm (TIFF 6.0, section 8). */
export function fromTiffTags(x: unknown, y: unknown, unit: unknown): StatedResolution | null {
  if (typeof x !== "number" || typeof y !== "number" || !(x > 0) || !(y > 0)) return null;
  return { x, y, unit: unit === 3 ? "cm" : unit === 1 ? null : "inch" };
}

/** Resolution in the JFIF header: unit 0 none, 1 inch, 2 cm (ITU-T T.871, 10.1). */
export function fromJfif(head: Uint8Array): StatedResolution | null {
  const view = new DataView(head.buffer, head.byteOffset, head.byteLength);
  const isJfif =
    head.byteLength >= 18 &&
    view.getUint32(0) === 0xff_d8_ff_e0 &&
    view.getUint32(6) === 0x4a_46_49_46;
  if (!isJfif) return null;
  const [unit, x, y] = [view.getUint8(13), view.getUint16(14), view.getUint16(16)];
  if (x === 0 || y === 0) return null;
  return { x, y, unit: unit === 1 ? "inch" : unit === 2 ? "cm" : null };
}

/** Resolution in the pHYs chunk of a PNG: unit 0 none, 1 metre (PNG, third edition, 11.3.4.3). */
export function fromPng(head: Uint8Array): StatedResolution | null {
  const view = new DataView(head.buffer, head.byteOffset, head.byteLength);
  for (let at = 8; at + 21 <= head.byteLength; at += 12 + view.getUint32(at)) {
    const type = view.getUint32(at + 4);
    if (type === 0x49_44_41_54) return null;
    if (type !== 0x70_48_59_73) continue;
    const [x, y] = [view.getUint32(at + 8), view.getUint32(at + 12)];
    if (x === 0 || y === 0) return null;
    return { x, y, unit: view.getUint8(at + 16) === 1 ? "m" : null };
  }
  return null;
}
