import "server-only";
import type { Reader } from "@/db/client";
import { renderFigure } from "@/lib/images/figure";
import type { ResolvedFigure } from "./pdf/document-resolver";

/** Brings the pictures of a case into its report, marks and scale bar drawn in. */
export function figureSource(reader: Reader): (imageId: string) => Promise<ResolvedFigure> {
  return async (imageId) => {
    const figure = await renderFigure(reader, imageId);
    return {
      image: figure.bytes,
      widthPx: figure.widthPx,
      heightPx: figure.heightPx,
      alt: figure.alt,
    };
  };
}
