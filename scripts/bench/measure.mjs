/** Time of one piece of work in ms. */
export async function timeOf(work) {
  const begun = performance.now();
  await work();
  return performance.now() - begun;
}

/**
 * Measures two things in turn, in pairs, so that both see the same moods of the machine. Which of a
 * pair comes first changes each time; warm-ups do not count.
 * @param {{ product: () => Promise<number>, yardstick: () => Promise<number> }} both each answers its figure
 * @param {{ pairs: number, warmUps: number }} how
 * @returns {Promise<{ product: number[], yardstick: number[] }>} pair by pair
 */
export async function inPairs(both, { pairs, warmUps }) {
  const found = { product: [], yardstick: [] };
  for (let i = -warmUps; i < pairs; i += 1) {
    const order = i % 2 === 0 ? ["product", "yardstick"] : ["yardstick", "product"];
    for (const which of order) {
      const figure = await both[which]();
      if (i >= 0) found[which].push(figure);
    }
  }
  return found;
}

/** Value below which the share `part` of the values lies, between neighbours in proportion. */
export function quantile(values, part) {
  const sorted = [...values].sort((a, b) => a - b);
  const place = (sorted.length - 1) * part;
  const low = Math.floor(place);
  const high = Math.ceil(place);
  return sorted[low] + (sorted[high] - sorted[low]) * (place - low);
}

export const median = (values) => quantile(values, 0.5);
