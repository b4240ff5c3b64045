import "server-only";

/** A4 in points, margins 19 mm at the sides. */
export const PAGE = { width: 595.28, height: 841.89 } as const;
export const MARGIN_PT = (19 / 25.4) * 72;
export const MEASURE_PT = PAGE.width - 2 * MARGIN_PT;
export const BODY_TOP_PT = 88;
export const BODY_BOTTOM_PT = 780;

export const INK = "#1a1712";
export const INK_2 = "#544e43";
export const RULE = "#d8d2c4";
export const BLUE = "#1b4f7e";
