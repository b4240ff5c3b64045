/** Where a page of a listing stands: keys in byte order, some folded into common prefixes. */
export interface Page<T> {
  items: T[];
  commonPrefixes: string[];
  /** Last key or common prefix of the page when more follow. */
  next: string | null;
}

/**
 * One page over items sorted by key.
 *
 * @param after Key or common prefix after which the page begins; empty for the first page.
 * @param compare Order of the keys.
 */
export function listPage<T extends { key: string }>(
  sorted: T[],
  {
    prefix,
    delimiter,
    after,
    limit,
  }: {
    prefix: string;
    delimiter: string;
    after: string;
    limit: number;
  },
  compare: (a: string, b: string) => number,
): Page<T> {
  const page: Page<T> = { items: [], commonPrefixes: [], next: null };
  const start = after !== "" && compare(after, prefix) > 0 ? after : prefix;
  let last = "";
  for (let place = firstAtOrAfter(sorted, start, compare); place < sorted.length; place += 1) {
    const item = sorted[place];
    if (!item || !item.key.startsWith(prefix)) break;
    if (after !== "" && compare(item.key, after) <= 0) continue;
    const cut = delimiter === "" ? -1 : item.key.indexOf(delimiter, prefix.length);
    const common = cut < 0 ? null : item.key.slice(0, cut + delimiter.length);
    if (common !== null && (common === last || common === after)) continue;
    if (page.items.length + page.commonPrefixes.length === limit) {
      page.next = last;
      break;
    }
    if (common === null) page.items.push(item);
    else page.commonPrefixes.push(common);
    last = common ?? item.key;
  }
  return page;
}

function firstAtOrAfter<T extends { key: string }>(
  sorted: T[],
  key: string,
  compare: (a: string, b: string) => number,
): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    const item = sorted[middle];
    if (item && compare(item.key, key) < 0) low = middle + 1;
    else high = middle;
  }
  return low;
}
