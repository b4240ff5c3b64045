/** Words MariaDB's InnoDB full text leaves out of its index (its default list). */
const STOP_WORDS = new Set(
  "a about an are as at be by com de en for from how i in is it la of on or that the this to was what when where who will with und www".split(
    " ",
  ),
);
const MIN_WORD = 3;

/**
 * A boolean-mode query in which every word must begin some word of the case, or null when nothing
 * typed is long enough to be in the index.
 */
export function fullTextQuery(typed: string): string | null {
  const words = typed
    .toLowerCase()
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word.length >= MIN_WORD && !STOP_WORDS.has(word));
  return words.length === 0 ? null : words.map((word) => `+${word}*`).join(" ");
}

/** A case number or the beginning of one, as typed: "2026-0142", "rl-2026". Null for other text. */
export function caseNumberPrefix(typed: string): string | null {
  const match = /^(?:rl-?)?(\d{4}(?:-\d{0,6})?)$/i.exec(typed.trim());
  return match ? `RL-${match[1]}` : null;
}
