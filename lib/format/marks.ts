/** Characters that values are set with. Spaces inside a value never break over a line. */
export const NO_BREAK_SPACE = "\u00a0";
/** Between groups of three figures: 11 400. */
export const GROUP_SPACE = "\u202f";
export const MINUS = "\u2212";
/** Stands where there is no number; never zero. */
export const DASH = "\u2013";
