/** The case spine is drawn on a grid of CSS pixels at 100 % text size and scales with the text. */
export const NODE_X = 46;
export const ROW = 52;
export const FIRST_NODE_Y = 36;
export const ORIGIN_BELOW = 92;
export const DRAWING_WIDTH = 62;

export interface SpineGeometry {
  height: number;
  originY: number;
  nodes: readonly { y: number; strand: string }[];
}

/** Where each node lies and how its strand runs: left and down beside the others, in order, so that
 *  none cross, and together into the origin. */
export function spineGeometry(count: number): SpineGeometry {
  const lastY = FIRST_NODE_Y + ROW * Math.max(0, count - 1);
  const originY = lastY + ORIGIN_BELOW;
  const nodes = Array.from({ length: count }, (_, index) => {
    const y = FIRST_NODE_Y + ROW * index;
    const x = Number((9 + 3.6 * index).toFixed(1));
    const strand = `M${NODE_X} ${y}C36 ${y + 1} ${x} ${y + 4} ${x} ${y + 24}V${originY - 40}C${x} ${originY - 16} 36 ${originY - 8} ${NODE_X} ${originY}`;
    return { y, strand };
  });
  return { height: originY + 16, originY, nodes };
}
