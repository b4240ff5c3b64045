import { outOfFocus } from "./blur";
import { develop } from "./develop";
import type { Picture, Size } from "./picture";
import { shaftScene } from "./shaft-scene";

/** Broken shaft half from in front and above; the far end goes out of focus. No scale: the view is slanted. */
export function fractureOblique(size: Size, seed: number): Picture {
  const scale = size.width / 2000;
  const scene = shaftScene(size, {
    pixelSizeMm: 0.082 / scale,
    face: { x: 0.33 * size.width, y: 0.57 * size.height },
    runsDeg: 24,
    turnDeg: 47,
    journalMm: 46,
    shoulderRadiusMm: 36,
    shoulderMm: 150,
    seed,
  });
  outOfFocus(scene, Math.round(11 * scale), (x, y) => {
    return (x / size.width - 0.5) * 1.5 - (y / size.height - 0.6) * 0.5;
  });
  return develop(
    scene,
    { bits: 8, grain: 0.01, vignette: 0.3, contrast: 1.08, lift: 0.01 },
    seed + 3,
  );
}
