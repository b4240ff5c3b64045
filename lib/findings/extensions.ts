import { Mark, Node } from "@tiptap/core";
import { TableKit } from "@tiptap/extension-table";
import StarterKit from "@tiptap/starter-kit";
import { CHART_FIGURE, CITED_VALUE, FIGURE, SECTION_HEADING } from "./document";

/**
 * An attribute that is written to the page as `data-…`, so that cutting and pasting inside the
 * text keeps what a part is bound to. The server checks every binding again when it saves.
 */
const kept = (name: string, fallback: string | null) => ({
  default: fallback,
  parseHTML: (element: HTMLElement) => element.getAttribute(name) ?? fallback,
  renderHTML: (attributes: Record<string, unknown>) => {
    const value = attributes[camelCase(name)];
    return typeof value === "string" && value !== "" ? { [name]: value } : {};
  },
});

const camelCase = (name: string) =>
  name.replace("data-", "").replace(/-(\w)/g, (_, letter: string) => letter.toUpperCase());

/** Head of a section; its order and words are fixed. */
export const SectionHeading = Node.create({
  name: SECTION_HEADING,
  group: "block",
  atom: true,
  selectable: false,
  addAttributes: () => ({ key: kept("data-key", ""), title: kept("data-title", "") }),
  parseHTML: () => [{ tag: "h2[data-key]", priority: 60 }],
  renderHTML: ({ node, HTMLAttributes }) => ["h2", HTMLAttributes, String(node.attrs.title)],
});

/** A value bound to a measurement. */
export const CitedValue = Node.create({
  name: CITED_VALUE,
  group: "inline",
  inline: true,
  atom: true,
  addAttributes: () => ({
    recordId: kept("data-record-id", ""),
    versionId: kept("data-version-id", ""),
    field: kept("data-field", ""),
    text: kept("data-text", ""),
    tag: kept("data-tag", ""),
    keptReason: kept("data-kept-reason", null),
  }),
  parseHTML: () => [{ tag: "span[data-record-id][data-version-id]" }],
  renderHTML: ({ node, HTMLAttributes }) => ["span", HTMLAttributes, String(node.attrs.text)],
  renderText: ({ node }) => String(node.attrs.text),
});

/** A picture of the case with its scale bar and, unless left out, its marks. */
export const Figure = Node.create({
  name: FIGURE,
  group: "block",
  atom: true,
  draggable: true,
  addAttributes: () => ({
    imageId: kept("data-image-id", ""),
    caption: kept("data-caption", ""),
    withMarks: {
      default: true,
      parseHTML: (element: HTMLElement) => element.getAttribute("data-marks") !== "none",
      renderHTML: ({ withMarks }: Record<string, unknown>) =>
        withMarks === false ? { "data-marks": "none" } : {},
    },
  }),
  parseHTML: () => [{ tag: "figure[data-image-id]" }],
  renderHTML: ({ node, HTMLAttributes }) => [
    "figure",
    HTMLAttributes,
    ["figcaption", String(node.attrs.caption)],
  ],
});

/** The chart of a traverse. */
export const ChartFigure = Node.create({
  name: CHART_FIGURE,
  group: "block",
  atom: true,
  draggable: true,
  addAttributes: () => ({
    traverseId: kept("data-traverse-id", ""),
    caption: kept("data-caption", ""),
  }),
  parseHTML: () => [{ tag: "figure[data-traverse-id]" }],
  renderHTML: ({ node, HTMLAttributes }) => [
    "figure",
    HTMLAttributes,
    ["figcaption", String(node.attrs.caption)],
  ],
});

const raised = (name: "subscript" | "superscript", tag: "sub" | "sup") =>
  Mark.create({
    name,
    excludes: "subscript superscript",
    parseHTML: () => [{ tag }],
    renderHTML: ({ HTMLAttributes }) => [tag, HTMLAttributes, 0],
  });

/** What stands in findings beside the four parts above. */
export const TEXT_EXTENSIONS = [
  StarterKit.configure({
    heading: { levels: [1, 2, 3] },
    link: { openOnClick: false, protocols: ["http", "https", "mailto"], defaultProtocol: "https" },
  }),
  TableKit.configure({ table: { resizable: false } }),
  raised("subscript", "sub"),
  raised("superscript", "sup"),
];

/** Everything that findings hold, for reading and checking a document without a page. */
export const FINDINGS_EXTENSIONS = [
  ...TEXT_EXTENSIONS,
  SectionHeading,
  CitedValue,
  Figure,
  ChartFigure,
];
