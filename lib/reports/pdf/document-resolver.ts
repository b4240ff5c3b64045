import "server-only";
import type { Chart } from "@/lib/charts/primitives";
import { AppError } from "@/lib/errors";
import type { CitedValueNode } from "@/lib/findings/document";
import type { FigureBlock } from "./model";

/** A picture as it is printed: marks and scale bar drawn, with what it shows in words. */
export type ResolvedFigure = Pick<FigureBlock, "image" | "widthPx" | "heightPx" | "alt">;

/** Brings in what a findings document only points at. Each throws when it is not there. */
export type DocumentResolver = {
  figure(imageId: string, options: { withMarks: boolean }): Promise<ResolvedFigure>;
  chart(traverseId: string): Promise<Chart>;
  /** The value as it is printed; left out, the text kept in the document is. */
  citedValue?(node: CitedValueNode): Promise<string>;
};

/** A document holds something that the report has no way to print; nothing is left out silently. */
export class UnknownDocumentPart extends AppError {
  constructor(readonly nodeType: string) {
    super(
      "INVALID",
      `The findings hold a part that a report cannot print ("${nodeType}"). The text is kept. Take that part out, then make the report again.`,
    );
    this.name = "UnknownDocumentPart";
  }
}
