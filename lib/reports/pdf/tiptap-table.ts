import "server-only";
import type { DocumentNode } from "@/lib/findings/document";
import { UnknownDocumentPart, type DocumentResolver } from "./document-resolver";
import type { Run, TableBlock, TableCell } from "./model";
import { inlineRuns } from "./tiptap-runs";

/** Longest row a table may have; wider ones could not be read on A4. */
const MOST_COLUMNS = 24;

/** A table node as a block. Leading rows made of head cells alone become the repeated head. */
export async function tableBlock(
  node: DocumentNode,
  resolver: DocumentResolver,
): Promise<TableBlock> {
  const rows: TableCell[][] = [];
  let headRows = 0;
  let open: number[] = [];
  for (const row of node.content ?? []) {
    if (row.type !== "tableRow") throw new UnknownDocumentPart(row.type);
    const cells = row.content ?? [];
    const { line, stillOpen } = await rowOf(cells, open, resolver);
    open = stillOpen;
    if (headRows === rows.length && cells.every(({ type }) => type === "tableHeader"))
      headRows += 1;
    rows.push(line);
  }
  const width = Math.max(0, ...rows.map(widthOf));
  return {
    kind: "table",
    columns: new Array(Math.min(MOST_COLUMNS, width)).fill({ align: "left" }),
    head: rows.slice(0, headRows),
    rows: rows.slice(headRows),
  };
}

/** `open` holds, per column, how many more rows a cell from above reaches down. */
async function rowOf(
  cells: readonly DocumentNode[],
  open: readonly number[],
  resolver: DocumentResolver,
): Promise<{ line: TableCell[]; stillOpen: number[] }> {
  const line: TableCell[] = [];
  const stillOpen: number[] = [];
  let at = 0;
  const passOpen = () => {
    while ((open[at] ?? 0) > 0) {
      line.push({ runs: [] });
      stillOpen[at] = (open[at] ?? 0) - 1;
      at += 1;
    }
  };
  for (const cell of cells) {
    if (cell.type !== "tableCell" && cell.type !== "tableHeader") {
      throw new UnknownDocumentPart(cell.type);
    }
    passOpen();
    const columnSpan = spanOf(cell, "colspan");
    const rowSpan = spanOf(cell, "rowspan");
    line.push({ runs: await cellRuns(cell.content ?? [], resolver), columnSpan });
    for (let i = 0; i < columnSpan; i++) stillOpen[at + i] = rowSpan - 1;
    at += columnSpan;
  }
  passOpen();
  return { line, stillOpen };
}

/** Paragraphs and list items of a cell, each on a line of its own. */
async function cellRuns(
  nodes: readonly DocumentNode[],
  resolver: DocumentResolver,
): Promise<Run[]> {
  const runs: Run[] = [];
  for (const node of nodes) {
    const before: Run[] = runs.length > 0 ? [{ text: "\n" }] : [];
    if (node.type === "paragraph" || node.type === "heading") {
      runs.push(...before, ...(await inlineRuns(node.content ?? [], resolver)));
    } else if (node.type === "bulletList" || node.type === "orderedList") {
      for (const [index, item] of (node.content ?? []).entries()) {
        const label = node.type === "orderedList" ? `${index + 1}. ` : "• ";
        const lead = runs.length > 0 ? "\n" : "";
        runs.push({ text: lead + label }, ...(await cellRuns(item.content ?? [], resolver)));
      }
    } else {
      throw new UnknownDocumentPart(`${node.type} inside a table`);
    }
  }
  return runs;
}

function spanOf(cell: DocumentNode, name: "colspan" | "rowspan"): number {
  const value = cell.attrs?.[name];
  return typeof value === "number" && Number.isInteger(value) && value > 1
    ? Math.min(value, 200)
    : 1;
}

function widthOf(row: readonly TableCell[]): number {
  return row.reduce((sum, cell) => sum + (cell.columnSpan ?? 1), 0);
}
