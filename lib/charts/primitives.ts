/**
 * What a chart is before anything draws it: a flat list of marks in a pixel frame, with the
 * words and the table that say the same. React, a saved SVG and the PDF all draw from this list.
 */

/** Colour by meaning. Screen renderers read the CSS variable of the same name. */
export type ChartToken =
  | "ch-1"
  | "ch-2"
  | "ch-3"
  | "ch-4"
  | "ch-limit"
  | "ch-grid"
  | "ch-axis"
  | "ch-band"
  | "ink"
  | "surface"
  | "met"
  | "warn-mark"
  | "paper"
  | "paper-ink"
  | "paper-ink-2"
  | "paper-rule"
  | "paper-band";

export type Stroke = { token: ChartToken; widthPx: number; dashPx?: readonly number[] };

export type MarkerShape =
  "filled-circle" | "open-circle" | "open-square" | "open-triangle" | "open-diamond" | "cross";

/** Lengths are px with y down; a text's y is its baseline; `rotateDeg` turns about (x, y). */
export type Primitive =
  | { kind: "path"; d: string; stroke?: Stroke; fill?: ChartToken; opacity?: number }
  | { kind: "line"; x1: number; y1: number; x2: number; y2: number; stroke: Stroke }
  | { kind: "polyline"; points: readonly (readonly [number, number])[]; stroke: Stroke }
  | {
      kind: "rect";
      x: number;
      y: number;
      width: number;
      height: number;
      radius?: number;
      fill?: ChartToken;
      stroke?: Stroke;
      opacity?: number;
    }
  | { kind: "circle"; x: number; y: number; r: number; fill?: ChartToken; stroke?: Stroke }
  | {
      kind: "marker";
      shape: MarkerShape;
      x: number;
      y: number;
      token: ChartToken;
      /** Fill of the open shapes, so that lines do not show through. */
      ground: ChartToken;
    }
  | {
      kind: "text";
      x: number;
      y: number;
      text: string;
      token: ChartToken;
      sizePx: number;
      weight: 400 | 600;
      anchor: "start" | "middle" | "end";
      rotateDeg?: number;
    };

export type TextPrimitive = Extract<Primitive, { kind: "text" }>;

/** The same data as the drawing, in the same order. Cells are shown text; no value is "–". */
export type ChartTable = {
  columns: readonly { label: string; align: "left" | "right" }[];
  rows: readonly (readonly string[])[];
};

/** One point a reader can step to, with what is said about it. */
export type Readout = { x: number; y: number; text: string };

export type LegendEntry = {
  text: string;
  token: ChartToken;
  shape: MarkerShape;
  /** Absent when the points are not joined. */
  line?: { widthPx: number; dashPx?: readonly number[] };
};

export type Chart = {
  widthPx: number;
  heightPx: number;
  /** The ground the open marks are filled with. */
  ground: ChartToken;
  primitives: readonly Primitive[];
  title: string;
  /** States the result, not the axes. Used as the accessible description and as alternate text. */
  description: string;
  table: ChartTable;
  legend: readonly LegendEntry[];
  readouts: readonly Readout[];
};
