/** The part of a custody entry that its place in the chain depends on. */
export type ChainLink = {
  position: number;
  at: Date;
  act: string;
  fromPlace: string;
  toPlace: string;
};

/**
 * What breaks the chain of one item, in words, first break first; empty when it is whole.
 * Each entry starts where the one before ended, and time does not run backwards (ASTM E1492,
 * minimum record, from memory; continuity is common practice).
 */
export function custodyBreaks(entries: readonly ChainLink[]): string[] {
  const inOrder = [...entries].sort((a, b) => a.position - b.position);
  const breaks: string[] = [];
  let previous: ChainLink | null = null;
  for (const entry of inOrder) {
    if (entry.act === "correction") continue;
    if (previous && entry.fromPlace !== previous.toPlace) {
      breaks.push(`left ${previous.toPlace}, taken up at ${entry.fromPlace}`);
    }
    if (previous && entry.at.getTime() < previous.at.getTime()) {
      breaks.push(`entry ${entry.position} is earlier than the one before`);
    }
    previous = entry;
  }
  return breaks;
}
