/** Below this every point keeps its marker: a hand-made traverse is never thinned. */
const ALWAYS_ALL = 60;

/**
 * Indices of the points that get a marker, in order. In a dense series a point is passed over when
 * a marker of the same kind already stands within `spacingPx` of it; first and last are kept.
 */
export function thinMarkers(
  points: readonly { x: number; y: number }[],
  spacingPx: number,
): number[] {
  if (points.length <= ALWAYS_ALL) return points.map((_, index) => index);
  const kept: number[] = [];
  const cells = new Map<string, true>();
  points.forEach((point, index) => {
    const cell = `${Math.floor(point.x / spacingPx)}:${Math.floor(point.y / spacingPx)}`;
    const isLast = index === points.length - 1;
    if (cells.has(cell) && !isLast) return;
    cells.set(cell, true);
    kept.push(index);
  });
  return kept;
}
