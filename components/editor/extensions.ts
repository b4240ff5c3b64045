import { mergeAttributes, Node } from "@tiptap/core";
import { TableKit } from "@tiptap/extension-table";
import StarterKit from "@tiptap/starter-kit";
import { CHART_FIGURE, CITED_VALUE, FIGURE, SECTION_HEADING } from "@/lib/findings/document";

const attribute = (fallback: string | boolean | null) => ({ default: fallback, rendered: false });

/** Head of a section; its order and words are fixed. */
export const SectionHeading = Node.create({
  name: SECTION_HEADING,
  group: "block",
  atom: true,
  selectable: false,
  addAttributes: () => ({ key: attribute(""), title: attribute("") }),
  parseHTML: () => [{ tag: "h2[data-section]" }],
  renderHTML: ({ node }) => [
    "h2",
    { "data-section": String(node.attrs.key) },
    String(node.attrs.title),
  ],
});

/** A value bound to a measurement. */
export const CitedValue = Node.create({
  name: CITED_VALUE,
  group: "inline",
  inline: true,
  atom: true,
  addAttributes: () => ({
    recordId: attribute(""),
    versionId: attribute(""),
    field: attribute(""),
    text: attribute(""),
    tag: attribute(""),
    keptReason: attribute(null),
  }),
  renderHTML: ({ node }) => ["span", { "data-cited": "" }, String(node.attrs.text)],
  renderText: ({ node }) => String(node.attrs.text),
});

/** A picture of the case with its marks and scale bar. */
export const Figure = Node.create({
  name: FIGURE,
  group: "block",
  atom: true,
  draggable: true,
  addAttributes: () => ({
    imageId: attribute(""),
    caption: attribute(""),
    withMarks: attribute(true),
  }),
  renderHTML: ({ node, HTMLAttributes }) => [
    "figure",
    mergeAttributes(HTMLAttributes),
    String(node.attrs.caption),
  ],
});

/** The chart of a traverse. */
export const ChartFigure = Node.create({
  name: CHART_FIGURE,
  group: "block",
  atom: true,
  draggable: true,
  addAttributes: () => ({ traverseId: attribute(""), caption: attribute("") }),
  renderHTML: ({ node, HTMLAttributes }) => [
    "figure",
    mergeAttributes(HTMLAttributes),
    String(node.attrs.caption),
  ],
});

/** What stands in findings beside the four nodes above. */
export const TEXT_EXTENSIONS = [
  StarterKit.configure({
    heading: { levels: [1, 2, 3] },
    link: { openOnClick: false, protocols: ["http", "https", "mailto"], defaultProtocol: "https" },
  }),
  TableKit.configure({ table: { resizable: false } }),
];
