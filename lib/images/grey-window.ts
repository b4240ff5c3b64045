/** Share of samples left dark or bright at either end when 16 bits are brought to 8. */
const CLIPPED = 0.001;

/** Levels of 16 bit samples that are shown as black and as white. */
export type GreyWindow = { black: number; white: number };

/** The window that holds all but a thousandth of the samples at either end; never empty. */
export function windowOf(samples: Uint16Array): GreyWindow {
  const counts = new Uint32Array(65_536);
  for (const sample of samples) counts[sample] = (counts[sample] ?? 0) + 1;
  const reach = (from: number, step: 1 | -1) => {
    let left = CLIPPED * samples.length;
    let level = from;
    while (level + step >= 0 && level + step < counts.length) {
      left -= counts[level] ?? 0;
      if (left < 0) break;
      level += step;
    }
    return level;
  };
  const black = Math.min(reach(0, 1), 65_534);
  return { black, white: Math.max(reach(65_535, -1), black + 1) };
}

/** Slope and offset that spread a window over all 16 bits. */
export function spread({ black, white }: GreyWindow): { slope: number; offset: number } {
  const slope = 65_535 / (white - black);
  return { slope, offset: -black * slope };
}
