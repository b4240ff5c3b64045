import { pointsOf } from "@/lib/images/mark-schemas";
import { BENCH_PANEL, benchButton } from "./bench-look";
import { withoutPoint, withPointAfter } from "./drawing";
import type { PointEdits } from "./use-point-edits";

type Props = { edits: PointEdits; error: string | null; isBusy: boolean };

/** The points of the mark in hand, one chosen: what dragging does can be done from here too. */
export function PointPanel({ edits, error, isBusy }: Props) {
  if (!edits.editing) return null;
  const { mark, geometry, index } = edits.editing;
  const small = benchButton({ small: true });
  return (
    <section
      aria-label={`Points of ${mark.label}`}
      className={`${BENCH_PANEL} grid gap-2.5 px-3.5 py-3 text-12`}
    >
      <h2 className="text-13 font-head">Points of {mark.label}</h2>
      <p>
        Drag a point, or choose one and press where it belongs.{" "}
        <span className="text-ib-ink-2">By keys: arrows move the chosen point.</span>
      </p>
      <div className="flex items-center gap-2">
        <button
          type="button"
          aria-label="Point before"
          className={small}
          onClick={() => edits.choosePoint(index - 1)}
        >
          ‹
        </button>
        <span role="status" className="tn min-w-24 text-center">
          Point {index + 1} of {pointsOf(geometry).length}
        </span>
        <button
          type="button"
          aria-label="Point after"
          className={small}
          onClick={() => edits.choosePoint(index + 1)}
        >
          ›
        </button>
      </div>
      <div className="flex gap-2">
        {withPointAfter(geometry, index) && (
          <button type="button" className={small} onClick={edits.addPoint}>
            Add one after
          </button>
        )}
        {withoutPoint(geometry, index) && (
          <button type="button" className={small} onClick={edits.takeOutPoint}>
            {geometry.tool === "ratchet" ? "Take out its line" : "Take it out"}
          </button>
        )}
      </div>
      {error && (
        <p role="alert" className="text-ib-final">
          {error} Your points are kept here.
        </p>
      )}
      <div className="flex gap-2">
        <button type="button" className={small} onClick={edits.giveUp}>
          Leave as it was
        </button>
        <button
          type="button"
          className={benchButton({ small: true, primary: true })}
          disabled={isBusy}
          onClick={() => void edits.save()}
        >
          {isBusy ? "Saving" : "Save the points"}
        </button>
      </div>
    </section>
  );
}
