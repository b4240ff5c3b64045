"use client";

import type { Viewer } from "openseadragon";
import { type RefObject, useCallback, useEffect, useRef, useState } from "react";
import type { Point } from "@/lib/imaging/point";
import { isSecondPress, type Press } from "./double-press";
import type { View } from "./view";

export type DeepZoom = {
  /** Null until the picture is open. */
  view: View | null;
  /** The tiles could not be opened. */
  hasFailed: boolean;
  zoomBy(factor: number): void;
  whole(): void;
  oneToOne(): void;
  panBy(x: number, y: number): void;
  /** Brings a place of the picture into sight when it is outside. */
  show(point: Point): void;
};

export type PanelMargins = { left: number; top: number; right: number; bottom: number };

/** One step nearer, by key or button. */
export const ZOOM_STEP = 1.4;
const ZOOM_SECONDS = 0.25;
const MOST_MAGNIFIED = 16;

/**
 * Opens a tiled picture in `element` and tells how it lies on the screen at every move. Presses go
 * to `onPress` once each, in screen pixels, and say whether they are the second of a double press;
 * dragging and the wheel stay with the viewer.
 */
export function useDeepZoom(
  element: RefObject<HTMLElement | null>,
  infoUrl: string | null,
  margins: PanelMargins,
  onPress: (at: Point, isSecond: boolean, view: View) => void,
): DeepZoom {
  const viewer = useRef<Viewer | null>(null);
  const press = useRef(onPress);
  useEffect(() => {
    press.current = onPress;
  });
  const [view, setView] = useState<View | null>(null);
  const [hasFailed, setHasFailed] = useState(false);
  const { left, top, right, bottom } = margins;

  useEffect(() => {
    const host = element.current;
    if (!host || !infoUrl) return;
    let isGone = false;
    const open = async () => {
      const { default: openSeadragon } = await import("openseadragon");
      if (isGone) return;
      const made = openSeadragon({
        element: host,
        tileSources: infoUrl,
        drawer: "canvas",
        showNavigationControl: false,
        keyboardNavEnabled: false,
        // The host has the focus and the name; the canvas inside it would be a second, nameless stop.
        tabIndex: -1,
        animationTime: matchMedia("(prefers-reduced-motion: reduce)").matches ? 0 : ZOOM_SECONDS,
        springStiffness: 10,
        visibilityRatio: 0.2,
        minZoomImageRatio: 0.5,
        maxZoomPixelRatio: MOST_MAGNIFIED,
        viewportMargins: { left, top, right, bottom },
        gestureSettingsMouse: { clickToZoom: false, dblClickToZoom: false },
        gestureSettingsTouch: { clickToZoom: false, dblClickToZoom: false, pinchRotate: false },
        gestureSettingsPen: { clickToZoom: false, dblClickToZoom: false },
      });
      viewer.current = made;
      const look = (): View | null => {
        const image = made.world.getItemAt(0);
        if (!image) return null;
        const zero = image.imageToViewerElementCoordinates(new openSeadragon.Point(0, 0));
        const far = image.imageToViewerElementCoordinates(new openSeadragon.Point(1000, 0));
        return { scale: (far.x - zero.x) / 1000, x: zero.x, y: zero.y };
      };
      const tell = () => {
        const next = look();
        if (!next) return;
        setView((now) =>
          now && now.scale === next.scale && now.x === next.x && now.y === next.y ? now : next,
        );
      };
      for (const event of ["open", "update-viewport", "resize"] as const) {
        made.addHandler(event, tell);
      }
      made.addHandler("open-failed", () => setHasFailed(true));
      // The viewer tells of a double press after it told of both presses, which is too late.
      let before: Press | null = null;
      made.addHandler("canvas-click", ({ quick, position, originalEvent }) => {
        const now = look();
        if (!quick || !now) return;
        const isTouch =
          originalEvent instanceof PointerEvent && originalEvent.pointerType === "touch";
        const here: Press = {
          at: [position.x, position.y],
          timeMs: originalEvent.timeStamp,
          isTouch,
        };
        const isSecond = isSecondPress(before, here);
        before = here;
        press.current(here.at, isSecond, now);
      });
    };
    open().catch(() => setHasFailed(true));
    return () => {
      isGone = true;
      viewer.current?.destroy();
      viewer.current = null;
      setView(null);
      setHasFailed(false);
    };
  }, [element, infoUrl, left, top, right, bottom]);

  const zoomBy = useCallback((factor: number) => {
    viewer.current?.viewport?.zoomBy(factor);
    viewer.current?.viewport?.applyConstraints();
  }, []);
  const whole = useCallback(() => viewer.current?.viewport?.goHome(), []);
  const oneToOne = useCallback(() => {
    const open = viewer.current;
    const image = open?.world.getItemAt(0);
    if (open && image) open.viewport.zoomTo(image.imageToViewportZoom(1));
  }, []);
  const panBy = useCallback((x: number, y: number) => {
    const viewport = viewer.current?.viewport;
    if (!viewport) return;
    const step = viewport.getCenter().clone();
    step.x = x;
    step.y = y;
    viewport.panBy(viewport.deltaPointsFromPixels(step));
    viewport.applyConstraints();
  }, []);
  const show = useCallback((point: Point) => {
    const open = viewer.current;
    const image = open?.world.getItemAt(0);
    if (!open || !image) return;
    const place = image.imageToViewportCoordinates(point[0], point[1]);
    if (!open.viewport.getBounds().containsPoint(place)) open.viewport.panTo(place);
  }, []);

  return { view, hasFailed, zoomBy, whole, oneToOne, panBy, show };
}
