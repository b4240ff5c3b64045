/** Strokes of one character on a grid 4 wide and 6 high: polylines of "xy" digit pairs. */
const GLYPHS: Record<string, string> = {
  "0": "10 01 05 16 36 45 41 30 10",
  "1": "11 20 26|16 36",
  "2": "01 10 30 41 42 06 46",
  "3": "00 40 22 32 43 45 36 16 05",
  "4": "36 30 04 44",
  "5": "40 00 03 32 43 45 36 06",
  "6": "40 20 02 05 16 36 45 44 33 03",
  "7": "00 40 16",
  "8": "10 01 02 13 33 44 45 36 16 05 04 13|33 42 41 30 10",
  "9": "06 26 44 41 30 10 01 02 13 43",
  A: "06 20 46|14 34",
  B: "00 06 36 45 44 33 03|33 42 41 30 00",
  C: "41 30 10 01 05 16 36 45",
  D: "00 06 26 44 42 20 00",
  E: "40 00 06 46|03 33",
  F: "40 00 06|03 33",
  G: "41 30 10 01 05 16 36 45 43 23",
  H: "00 06|40 46|03 43",
  I: "10 30|20 26|16 36",
  J: "40 45 36 16 05",
  K: "00 06|40 03 46",
  L: "00 06 46",
  M: "06 00 23 40 46",
  N: "06 00 46 40",
  O: "10 01 05 16 36 45 41 30 10",
  P: "06 00 30 41 42 33 03",
  Q: "10 01 05 16 36 45 41 30 10|24 46",
  R: "06 00 30 41 42 33 03|23 46",
  S: "41 30 10 01 02 13 33 44 45 36 16 05",
  T: "00 40|20 26",
  U: "00 05 16 36 45 40",
  V: "00 26 40",
  W: "00 16 23 36 40",
  X: "00 46|40 06",
  Y: "00 23 40|23 26",
  Z: "00 40 06 46",
  k: "00 06|32 04 36",
  m: "02 06|03 12 23 26|23 32 43 46",
  n: "02 06|03 12 32 43 46",
  x: "02 46|42 06",
  µ: "02 08|05 16 36 45|42 46",
  ".": "25 26",
  "-": "13 33",
  "/": "06 40",
  ",": "26 17",
  " ": "",
};

/** One stroke as points on the glyph grid. */
export type Stroke = ReadonlyArray<readonly [number, number]>;

/** Strokes of a character; one without a drawing is left out. */
export function strokesOf(character: string): Stroke[] {
  const drawing = GLYPHS[character];
  if (!drawing) return [];
  return drawing
    .split("|")
    .map((line) => line.split(" ").map((pair) => [Number(pair[0]), Number(pair[1])] as const));
}
