export type Box = { x: number; y: number; width: number; height: number };

/** Keeps track of what is taken in a plot, so that labels can be put where nothing is. */
export type LabelSpace = {
  take(box: Box): void;
  /** Takes the first free candidate, or the one that covers least when none is free. */
  place<T extends Box>(candidates: readonly [T, ...T[]]): T;
};

export function createLabelSpace(bounds: Box): LabelSpace {
  const taken: Box[] = [];

  function cost(box: Box): number {
    const outside = box.width * box.height - overlapArea(box, bounds);
    // Leaving the plot is worse than covering a mark inside it.
    return taken.reduce((sum, other) => sum + overlapArea(box, other), outside * 10);
  }

  return {
    take(box) {
      taken.push(box);
    },
    place(candidates) {
      let best = candidates[0];
      let bestCost = cost(best);
      for (const candidate of candidates.slice(1)) {
        if (bestCost <= 0) break;
        const candidateCost = cost(candidate);
        if (candidateCost < bestCost) {
          best = candidate;
          bestCost = candidateCost;
        }
      }
      taken.push(best);
      return best;
    },
  };
}

function overlapArea(a: Box, b: Box): number {
  const width = Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x);
  const height = Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y);
  return width > 0 && height > 0 ? width * height : 0;
}
