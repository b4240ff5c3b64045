/** Median time of one run in ms, after `warmUps` that do not count. */
export async function medianMs(
  work: () => unknown,
  { runs = 15, warmUps = 3 } = {},
): Promise<number> {
  for (let i = 0; i < warmUps; i += 1) await work();
  const times: number[] = [];
  for (let i = 0; i < runs; i += 1) {
    const begun = performance.now();
    await work();
    times.push(performance.now() - begun);
  }
  times.sort((a, b) => a - b);
  return times[Math.floor(times.length / 2)] ?? Number.NaN;
}

export type Measured = { what: string; ms: number; yardstick: string; yardstickMs: number };

/** One line: what was measured, how long, and how many times the yardstick. */
export function lineOf({ what, ms, yardstick, yardstickMs }: Measured): string {
  return `${what}: ${short(ms)} ms, ${short(ms / yardstickMs)} times "${yardstick}" (${short(yardstickMs)} ms)`;
}

const short = (value: number) => (value >= 100 ? value.toFixed(0) : value.toPrecision(3));
