/** Repeatable stream of numbers in [0, 1): the same seed always gives the same stream. */
export function randomStream(seed: number): () => number {
  let state = (seed ^ 0x9e3779b9) >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

/** Number in [low, high) from a stream. */
export function between(random: () => number, low: number, high: number): number {
  return low + (high - low) * random();
}

/** Normal deviate, mean 0 and standard deviation 1. */
export function normal(random: () => number): number {
  const radius = Math.sqrt(-2 * Math.log(1 - random()));
  return radius * Math.cos(2 * Math.PI * random());
}
