import "server-only";
import type { Reader } from "@/db/client";
import { renderFigure } from "@/lib/images/figure";
import type { DocumentResolver } from "./pdf/document-resolver";

/** Brings the pictures of a case into its report, scale bar and marks drawn in. */
export function figureSource(reader: Reader): DocumentResolver["figure"] {
  return async (imageId, options) => {
    const figure = await renderFigure(reader, imageId, options);
    return {
      image: figure.bytes,
      widthPx: figure.widthPx,
      heightPx: figure.heightPx,
      alt: figure.alt,
    };
  };
}
