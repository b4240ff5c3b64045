import "server-only";
import type { Chart } from "@/lib/charts/primitives";

/** A stretch of text in one style. A line break inside is "\n". */
export type Run = {
  text: string;
  bold?: boolean;
  italic?: boolean;
  underline?: boolean;
  strike?: boolean;
  mono?: boolean;
  raised?: "sub" | "sup";
  /** A value bound to a measurement: set as plain text that never splits over lines. */
  cited?: boolean;
  /** Printed at the foot of the page on which the run stands. */
  footnote?: string;
};

export type TableCell = { runs: Run[]; columnSpan?: number };

export type TableBlock = {
  kind: "table";
  /** Numbered tables are headed "Table 3. ..." */
  number?: number;
  caption?: Run[];
  columns: { align: "left" | "right" | "center" }[];
  /** Repeated at the top of every page that the table reaches. */
  head: TableCell[][];
  rows: TableCell[][];
  note?: Run[];
};

export type FigureBlock = {
  kind: "figure";
  number?: number;
  /** PNG or JPEG, with marks and scale bar already drawn. */
  image: Uint8Array;
  widthPx: number;
  heightPx: number;
  alt: string;
  caption: Run[];
};

export type ChartBlock = { kind: "chart"; number?: number; chart: Chart; caption: Run[] };

export type Block =
  | { kind: "heading"; level: 1 | 2 | 3; runs: Run[] }
  | { kind: "paragraph"; runs: Run[] }
  | { kind: "list"; ordered: boolean; start?: number; items: Block[][] }
  | { kind: "quote"; blocks: Block[] }
  | { kind: "code"; text: string }
  | { kind: "rule" }
  | { kind: "callout"; title?: string; blocks: Block[] }
  | TableBlock
  | FigureBlock
  | ChartBlock;

/** `number` is printed before the title; unnumbered sections (annexes) leave it out. */
export type ReportSection = {
  /** Name of the section in the document, for callers that pick one out. */
  key?: string;
  number?: string;
  title: string;
  blocks: Block[];
};

/** `meaning` says what the signature stands for; `decides` draws it as the one that counts. */
export type ReportSignature = {
  act: string;
  name: string;
  role?: string;
  /** Date, and for a signature time with zone, as shown: "9 December 2026, 10:14 UTC". */
  at: string;
  meaning?: string;
  decides?: boolean;
};

export type ReportModel = {
  letterhead: { laboratoryName: string; addressLine: string };
  caseNumber: string;
  issueNumber: number;
  title: string;
  /** Line above the title: "Findings report, issue 1, signed 9 December 2026". */
  kicker: string;
  /** Set on every page while unsigned: "Draft 7, not signed". */
  draft?: { label: string };
  /** Laid out two to a row. */
  facts: { label: string; text: string }[];
  answer: Block[];
  /** What the cause rests on, what it is not, what to do. */
  summary: { title: string; blocks: Block[] }[];
  /** Stands beside the summary on the first page. */
  leadFigure?: FigureBlock;
  signatures: ReportSignature[];
  sections: ReportSection[];
  cautions: ReportCaution[];
  /** SHA-256 of the frozen manifest in hex; absent while a draft. */
  fingerprint?: string;
  /** Becomes the creation date of the file, so that the same model gives the same bytes. */
  createdAt: Date;
};

export type ReportCaution = { text: string; onFirstPage?: boolean };

export type WrittenReport = {
  pdf: Buffer;
  pageCount: number;
  /** Whole sentences for the person who writes the report. */
  warnings: string[];
};
