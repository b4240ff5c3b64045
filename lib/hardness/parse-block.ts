import { parseNumberCell, type CellProblem, type CellProblemCode } from "./parse-cell";
import { splitBlock, type Separator, type SplitLine } from "./split-block";

/** One block holds at most this many rows. */
export const MOST_BLOCK_ROWS = 10_000;

export type BlockColumns = "depth_hardness" | "depth_diagonals";
export type BlockCell = "depth" | "hardness" | "d1" | "d2";

export interface BlockRow {
  /** Line of the pasted text, from 1. */
  readonly line: number;
  /** The cells as pasted: nothing is lost when one cannot be read. */
  readonly cells: readonly string[];
  /** `null` where the cell cannot be read or cannot be, or the block has no such column. */
  readonly depthMm: number | null;
  readonly hardness: number | null;
  readonly d1Um: number | null;
  readonly d2Um: number | null;
  readonly note: string | null;
  readonly problems: readonly (CellProblem & { readonly cell: BlockCell })[];
}

export type ParsedBlock =
  | {
      readonly status: "read";
      readonly columns: BlockColumns;
      readonly hasNotes: boolean;
      readonly separator: Separator;
      readonly header: readonly string[] | null;
      readonly rows: readonly BlockRow[];
      readonly problemRows: number;
      /** "17 rows, 3 columns; decimal commas read as points". */
      readonly summary: string;
    }
  | {
      readonly status: "refused";
      readonly code: BlockRefusalCode;
      readonly reason: string;
    };

export type BlockRefusalCode =
  "empty" | "too_many_rows" | "column_count" | "unclear_commas" | "depth_not_in_mm";

const refused = (code: BlockRefusalCode, reason: string): ParsedBlock => ({
  status: "refused",
  code,
  reason,
});

const isNumber = (cell: string | undefined) =>
  cell !== undefined && "value" in parseNumberCell(cell);

/** A first line in which no cell begins like a number names the columns. */
function isHeader({ cells }: SplitLine): boolean {
  return (
    cells.some((cell) => /\p{L}/u.test(cell)) &&
    !cells.some((cell) => /^[+\-\u2212.,]?\d/.test(cell) || /^nan$/i.test(cell))
  );
}

function columnsOf(lines: readonly SplitLine[], width: number) {
  const third = lines.flatMap(({ cells }) => (cells[2] ? [cells[2]] : []));
  const numeric = third.filter(isNumber).length;
  const hasDiagonals = width >= 4 || (third.length > 0 && numeric * 2 >= third.length);
  return hasDiagonals
    ? { columns: "depth_diagonals" as const, names: ["depth", "d1", "d2"] as const }
    : { columns: "depth_hardness" as const, names: ["depth", "hardness"] as const };
}

/** A cell that was read as a number may still be one that no indent can have. */
function rangeProblem(cell: BlockCell, value: number): CellProblem | null {
  if (cell === "depth")
    return value < 0
      ? { code: "negative_depth", text: "A depth below zero lies outside the piece." }
      : null;
  const what = cell === "hardness" ? "A hardness" : "A diagonal";
  return value > 0 ? null : { code: "not_positive", text: `${what} has to be above zero.` };
}

function readRow(
  { line, cells }: SplitLine,
  names: readonly BlockCell[],
  lineOfDepth: Map<number, number>,
): { readonly row: BlockRow; readonly hadDecimalComma: boolean } {
  const values: Partial<Record<BlockCell, number>> = {};
  const problems: (CellProblem & { cell: BlockCell })[] = [];
  const note = (code: CellProblemCode, cell: BlockCell, text: string) =>
    problems.push({ code, cell, text });
  let hadDecimalComma = false;
  names.forEach((cell, index) => {
    const parsed = parseNumberCell(cells[index] ?? "");
    if ("problem" in parsed) return note(parsed.problem.code, cell, parsed.problem.text);
    hadDecimalComma ||= parsed.hadDecimalComma;
    const outOfRange = rangeProblem(cell, parsed.value);
    if (outOfRange) return note(outOfRange.code, cell, outOfRange.text);
    values[cell] = parsed.value;
    if (cell !== "depth") return;
    const earlier = lineOfDepth.get(parsed.value);
    if (earlier === undefined) lineOfDepth.set(parsed.value, line);
    else
      note(
        "duplicate_depth",
        cell,
        `Depth ${parsed.value}\u00a0mm is on line ${earlier} too. Correct one, or give each row of indents its own track.`,
      );
  });
  const rest = cells.slice(names.length).filter((cell) => cell !== "");
  const row: BlockRow = {
    line,
    cells,
    depthMm: values.depth ?? null,
    hardness: values.hardness ?? null,
    d1Um: values.d1 ?? null,
    d2Um: values.d2 ?? null,
    note: rest.length > 0 ? rest.join(" ") : null,
    problems,
  };
  return { row, hadDecimalComma };
}

const SEPARATOR_TEXT: Record<Separator, string> = {
  tab: "",
  semicolon: "",
  comma: "; commas read as column marks",
  space: "; spaces read as column marks",
};

function plural(count: number, word: string): string {
  return `${count} ${word}${count === 1 ? "" : "s"}`;
}

/**
 * Reads a pasted block of readings: depth and hardness, or depth and two diagonals, with an optional
 * column of notes and an optional header line. Depth in mm, diagonals in um. A cell that cannot be
 * read keeps its text and says why; the rest of its row is read all the same.
 */
export function parseBlock(text: string): ParsedBlock {
  const split = splitBlock(text);
  if ("refused" in split) return refused(split.refused, split.reason);
  const [first] = split.lines;
  if (!first) return refused("empty", "There is nothing to read. Copy the rows and paste again.");
  const header = isHeader(first) ? first.cells : null;
  const lines = header ? split.lines.slice(1) : split.lines;
  if (lines.length === 0)
    return refused("empty", "There is a header line and no row. Copy the rows and paste again.");
  if (lines.length > MOST_BLOCK_ROWS)
    return refused(
      "too_many_rows",
      `The block has ${lines.length} rows; ${MOST_BLOCK_ROWS} is the most. Paste it in parts.`,
    );
  if (header && /[µμ]m|micron/i.test(header[0] ?? ""))
    return refused("depth_not_in_mm", "The header gives the depth in µm. Depths here are in mm.");
  const width = lines.reduce((widest, { cells }) => {
    const filled = cells.findLastIndex((cell) => cell !== "") + 1;
    return Math.max(widest, filled);
  }, 0);
  if (width < 2 || width > 4)
    return refused(
      "column_count",
      `The block has ${plural(width, "column")}. Paste depth and hardness, or depth and two diagonals, with a note behind them if you like.`,
    );
  const { columns, names } = columnsOf(lines, width);
  const lineOfDepth = new Map<number, number>();
  const read = lines.map((line) => readRow(line, names, lineOfDepth));
  const rows = read.map(({ row }) => row);
  const problemRows = rows.filter(({ problems }) => problems.length > 0).length;
  const hasCommas = read.some(({ hadDecimalComma }) => hadDecimalComma);
  const summary = [
    `${plural(rows.length, "row")}, ${plural(width, "column")}`,
    header ? "; first line read as header" : "",
    SEPARATOR_TEXT[split.separator],
    hasCommas ? "; decimal commas read as points" : "",
    problemRows > 0 ? `; ${plural(problemRows, "row")} to look at` : "",
  ].join("");
  return {
    status: "read",
    columns,
    hasNotes: rows.some(({ note }) => note !== null),
    separator: split.separator,
    header,
    rows,
    problemRows,
    summary,
  };
}
