import "server-only";
import {
  CHART_FIGURE,
  type DocumentNode,
  FIGURE,
  plainTextOf,
  SECTION_HEADING,
} from "@/lib/findings/document";
import { UnknownDocumentPart, type DocumentResolver } from "./document-resolver";
import type { Block, ReportSection } from "./model";
import { inlineRuns } from "./tiptap-runs";
import { tableBlock } from "./tiptap-table";

/** Counts on over a whole report, so that figures are numbered in the order they are printed. */
export type Numbering = { nextFigure: number };

/**
 * Turns a findings document into blocks for the report. Throws UnknownDocumentPart for anything it
 * does not know, and whatever the resolver throws for a figure, chart or value that is not there.
 */
export async function documentToBlocks(
  document: DocumentNode,
  resolver: DocumentResolver,
  numbering: Numbering = { nextFigure: 1 },
): Promise<Block[]> {
  return blocksOf(document.content ?? [], resolver, numbering);
}

/**
 * The same, split at section headings. What stands before the first one comes back as `opening`.
 * Sections without a number of their own are numbered from 1.
 */
export async function documentToSections(
  document: DocumentNode,
  resolver: DocumentResolver,
  numbering: Numbering = { nextFigure: 1 },
): Promise<{ opening: Block[]; sections: ReportSection[] }> {
  const opening: Block[] = [];
  const sections: ReportSection[] = [];
  for (const node of document.content ?? []) {
    if (node.type === SECTION_HEADING) {
      sections.push(sectionOf(node, sections.length + 1));
    } else {
      const into = sections.at(-1)?.blocks ?? opening;
      into.push(...(await blocksOf([node], resolver, numbering)));
    }
  }
  return { opening, sections };
}

function sectionOf(node: DocumentNode, position: number): ReportSection {
  const title = plainTextOf(node) || text(node, "title");
  const key = text(node, "key");
  const number = node.attrs?.number;
  return {
    ...(key && { key }),
    number: typeof number === "number" || typeof number === "string" ? `${number}` : `${position}`,
    title,
    blocks: [],
  };
}

async function blocksOf(
  nodes: readonly DocumentNode[],
  resolver: DocumentResolver,
  numbering: Numbering,
): Promise<Block[]> {
  const blocks: Block[] = [];
  for (const node of nodes) blocks.push(await blockOf(node, resolver, numbering));
  return blocks;
}

async function blockOf(
  node: DocumentNode,
  resolver: DocumentResolver,
  numbering: Numbering,
): Promise<Block> {
  const content = node.content ?? [];
  switch (node.type) {
    case "paragraph":
      return { kind: "paragraph", runs: await inlineRuns(content, resolver) };
    case "heading":
      return { kind: "heading", level: levelOf(node), runs: await inlineRuns(content, resolver) };
    case SECTION_HEADING:
      return { kind: "heading", level: 1, runs: [{ text: sectionOf(node, 1).title }] };
    case "bulletList":
    case "orderedList":
      return listOf(node, resolver, numbering);
    case "blockquote":
      return { kind: "quote", blocks: await blocksOf(content, resolver, numbering) };
    case "codeBlock":
      return { kind: "code", text: content.map((child) => child.text ?? "").join("") };
    case "horizontalRule":
      return { kind: "rule" };
    case "table":
      return tableBlock(node, resolver);
    case FIGURE: {
      const figure = await resolver.figure(text(node, "imageId"), {
        withMarks: node.attrs?.withMarks !== false,
      });
      const number = numbering.nextFigure++;
      return { kind: "figure", number, ...figure, caption: [{ text: text(node, "caption") }] };
    }
    case CHART_FIGURE: {
      const chart = await resolver.chart(text(node, "traverseId"));
      const number = numbering.nextFigure++;
      return { kind: "chart", number, chart, caption: [{ text: text(node, "caption") }] };
    }
    default:
      throw new UnknownDocumentPart(node.type);
  }
}

async function listOf(
  node: DocumentNode,
  resolver: DocumentResolver,
  numbering: Numbering,
): Promise<Block> {
  const items: Block[][] = [];
  for (const item of node.content ?? []) {
    if (item.type !== "listItem") throw new UnknownDocumentPart(item.type);
    items.push(await blocksOf(item.content ?? [], resolver, numbering));
  }
  const start = node.attrs?.start;
  const ordered = node.type === "orderedList";
  return { kind: "list", ordered, items, ...(typeof start === "number" && { start }) };
}

function levelOf(node: DocumentNode): 1 | 2 | 3 {
  const level = node.attrs?.level;
  return level === 2 || level === 3 ? level : 1;
}

function text(node: DocumentNode, name: string): string {
  const value = node.attrs?.[name];
  return typeof value === "string" ? value : "";
}
