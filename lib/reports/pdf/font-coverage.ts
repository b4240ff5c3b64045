import "server-only";

type Range = readonly [first: number, last: number];

/** Says whether a TrueType face maps a code point to a glyph of its own. */
export type Coverage = { has(codePoint: number): boolean };

const FORMAT_SEGMENTS = 4;
const FORMAT_GROUPS = 12;

/**
 * Reads the character map of a TrueType file (OpenType 1.9, "cmap", formats 4 and 12).
 * Throws on a file that has neither, because text set in it could come out as wrong letters.
 */
export function readCoverage(file: Uint8Array): Coverage {
  const view = new DataView(file.buffer, file.byteOffset, file.byteLength);
  const cmap = tableOffset(view, "cmap");
  const covered = new Set<number>();
  let read = 0;
  for (let i = 0; i < view.getUint16(cmap + 2); i++) {
    const subtable = cmap + view.getUint32(cmap + 4 + i * 8 + 4);
    const format = view.getUint16(subtable);
    if (format === FORMAT_SEGMENTS) addSegments(view, subtable, covered);
    else if (format === FORMAT_GROUPS) addGroups(view, subtable, covered);
    else continue;
    read += 1;
  }
  if (read === 0) throw new Error("The face has no character map of format 4 or 12.");
  return { has: (codePoint) => covered.has(codePoint) };
}

function tableOffset(view: DataView, tag: string): number {
  for (let i = 0; i < view.getUint16(4); i++) {
    const entry = 12 + i * 16;
    const name = String.fromCharCode(...[0, 1, 2, 3].map((k) => view.getUint8(entry + k)));
    if (name === tag) return view.getUint32(entry + 8);
  }
  throw new Error(`The face has no table ${tag}.`);
}

function addSegments(view: DataView, at: number, covered: Set<number>): void {
  const doubled = view.getUint16(at + 6);
  const ends = at + 14;
  const starts = ends + doubled + 2;
  const deltas = starts + doubled;
  const rangeOffsets = deltas + doubled;
  for (let i = 0; i < doubled; i += 2) {
    const range: Range = [view.getUint16(starts + i), view.getUint16(ends + i)];
    const delta = view.getUint16(deltas + i);
    const offset = view.getUint16(rangeOffsets + i);
    for (let code = range[0]; code <= range[1] && code !== 0xffff; code++) {
      const raw =
        offset === 0 ? code : view.getUint16(rangeOffsets + i + offset + (code - range[0]) * 2);
      const glyph = raw === 0 ? 0 : (raw + delta) & 0xffff;
      if (glyph !== 0) covered.add(code);
    }
  }
}

function addGroups(view: DataView, at: number, covered: Set<number>): void {
  for (let i = 0; i < view.getUint32(at + 12); i++) {
    const group = at + 16 + i * 12;
    const firstGlyph = view.getUint32(group + 8);
    const first = view.getUint32(group);
    for (let code = first; code <= view.getUint32(group + 4); code++) {
      if (firstGlyph + code - first !== 0) covered.add(code);
    }
  }
}
