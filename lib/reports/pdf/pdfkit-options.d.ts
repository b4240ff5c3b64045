/** Options that pdfkit 0.20 takes and its published types do not list yet. */
declare namespace PDFKit {
  interface PDFOutline {
    /** `top` and `left` are the place in points from the page's upper left corner. */
    addItem(
      title: string,
      options?: { expanded?: boolean; top?: number; left?: number },
    ): PDFOutline;
  }
  namespace Mixins {
    interface PDFVector {
      /** Lengths of dashes and gaps in turn. */
      dash(lengths: number[]): this;
    }
    interface StructureElementOptions {
      scope?: "Column" | "Row" | "Both";
      /** Left, top, right, bottom in points. */
      bbox?: [number, number, number, number];
    }
  }
}
