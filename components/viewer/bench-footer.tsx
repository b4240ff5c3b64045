import type { BenchPicture, FilmPicture } from "@/lib/images/bench-state";
import { benchButton } from "./bench-look";
import { FilmStrip } from "./film-strip";
import { type DeepZoom, ZOOM_STEP } from "./use-deep-zoom";

type Props = { picture: BenchPicture; film: readonly FilmPicture[]; zoom: DeepZoom };

/** The other pictures of the case, and how large this one is shown. */
export function BenchFooter({ picture, film, zoom }: Props) {
  return (
    <footer className="absolute inset-x-3 bottom-3 z-10 flex items-center gap-4 rounded-4 border border-ib-rule bg-ib-panel p-1.5">
      <FilmStrip caseId={picture.caseId} film={film} currentId={picture.id} />
      <span className="flex items-center gap-2 text-13">
        <button
          type="button"
          aria-label="Zoom out"
          className={benchButton()}
          onClick={() => zoom.zoomBy(1 / ZOOM_STEP)}
        >
          −
        </button>
        <span className="tn w-14 text-center">
          {zoom.view ? `${Math.round(zoom.view.scale * 100)} %` : "–"}
        </span>
        <button
          type="button"
          aria-label="Zoom in"
          className={benchButton()}
          onClick={() => zoom.zoomBy(ZOOM_STEP)}
        >
          +
        </button>
        <button type="button" className={benchButton()} onClick={zoom.whole}>
          Whole
        </button>
        <button type="button" className={benchButton()} onClick={zoom.oneToOne}>
          1 : 1
        </button>
      </span>
    </footer>
  );
}
