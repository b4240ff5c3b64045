/**
 * Index of the last item of an ascending list that is not above `value`; -1 when all are above it.
 */
export function lastAtOrBelow(ascending: readonly number[], value: number): number {
  let low = 0;
  let high = ascending.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    const item = ascending[middle];
    if (item !== undefined && item <= value) low = middle + 1;
    else high = middle;
  }
  return low - 1;
}
