import type { Point } from "@/lib/imaging/point";

/** One press on the picture, in screen pixels. */
export type Press = { at: Point; timeMs: number; isTouch: boolean };

const WITHIN_MS = 400;
/** A mouse stays put between two presses; a finger does not. Marks nearer than this are two marks. */
const WITHIN_PX = { mouse: 5, touch: 20 };

/** Whether a press is the second one of a double press that began with `before`. */
export function isSecondPress(before: Press | null, press: Press): boolean {
  if (!before || press.timeMs - before.timeMs > WITHIN_MS) return false;
  const apartPx = Math.hypot(press.at[0] - before.at[0], press.at[1] - before.at[1]);
  return apartPx <= (press.isTouch ? WITHIN_PX.touch : WITHIN_PX.mouse);
}
