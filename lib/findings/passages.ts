import type { Node as PartNode } from "@tiptap/pm/model";
import { CHART_FIGURE, CITED_VALUE, FIGURE, SECTION_HEADING } from "./document";

/** Text of one section with single spaces, and the place in the document of each character. */
export type SectionText = { text: string; positions: number[]; head: number };
type Range = { from: number; to: number };

const oneSpaced = (words: string) => words.replace(/\s+/g, " ").trim();

/** Text of every section by its key, as a reader sees it: cited values with their words. */
export function sectionTexts(doc: PartNode): Map<string, SectionText> {
  const sections = new Map<string, SectionText>();
  let open: SectionText | null = null;
  const put = (section: SectionText, written: string, positionOf: (i: number) => number) => {
    for (let i = 0; i < written.length; i += 1) {
      const isSpace = /\s/.test(written.charAt(i));
      if (isSpace && (section.text === "" || section.text.endsWith(" "))) continue;
      section.text += isSpace ? " " : written.charAt(i);
      section.positions.push(positionOf(i));
    }
  };
  doc.descendants((node, position) => {
    if (node.type.name === SECTION_HEADING) {
      open = { text: "", positions: [], head: position };
      sections.set(String(node.attrs.key), open);
      return;
    }
    if (!open) return;
    if (node.isText) put(open, node.text ?? "", (i) => position + i);
    else if (node.type.name === CITED_VALUE) put(open, String(node.attrs.text), () => position);
    else if (node.isBlock) put(open, " ", () => position);
  });
  return sections;
}

/** Where a passage stands in its section: its first place; null when it does not stand there. */
export function findPassage(
  sections: Map<string, SectionText>,
  section: string,
  passage: string,
): Range | null {
  const within = sections.get(section);
  const wanted = oneSpaced(passage);
  const at = wanted === "" ? -1 : (within?.text.indexOf(wanted) ?? -1);
  const from = within?.positions[at];
  const last = within?.positions[at + wanted.length - 1];
  return from === undefined || last === undefined ? null : { from, to: last + 1 };
}

/** Section and words that a stretch of the document covers, cut at the end of that section. */
export function passageAt(
  doc: PartNode,
  range: Range,
): { section: string; passage: string } | null {
  const within = [...sectionTexts(doc)].findLast(([, { head }]) => head <= range.from);
  if (!within) return null;
  const [section, { text, positions }] = within;
  const first = positions.findIndex((position) => position >= range.from);
  const end = positions.findIndex((position) => position >= range.to);
  if (first < 0) return { section, passage: "" };
  return { section, passage: oneSpaced(text.slice(first, end < 0 ? undefined : end)) };
}

/** Where the figure of this picture or traverse stands; null when it does not stand in the text. */
export function findFigure(doc: PartNode, figureId: string): Range | null {
  let found: Range | null = null;
  doc.descendants((node, position) => {
    const isIt =
      (node.type.name === FIGURE && node.attrs.imageId === figureId) ||
      (node.type.name === CHART_FIGURE && node.attrs.traverseId === figureId);
    if (isIt) found ??= { from: position, to: position + node.nodeSize };
  });
  return found;
}
