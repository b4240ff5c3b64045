/** Node names of the findings document that tie it to the case. */
export const CITED_VALUE = "citedValue";
export const FIGURE = "figure";
export const CHART_FIGURE = "chartFigure";
export const SECTION_HEADING = "sectionHeading";

/** Any node of a Tiptap document, as JSON. */
export type DocumentNode = {
  type: string;
  attrs?: Record<string, unknown>;
  content?: DocumentNode[];
  marks?: { type: string; attrs?: Record<string, unknown> }[];
  text?: string;
};

export type CitedValueNode = {
  recordId: string;
  versionId: string;
  field: string;
  text: string;
  keptReason: string | null;
};

function* nodesOf(node: DocumentNode): Generator<DocumentNode> {
  yield node;
  for (const child of node.content ?? []) yield* nodesOf(child);
}

const textAttribute = (node: DocumentNode, name: string): string | null => {
  const value = node.attrs?.[name];
  return typeof value === "string" && value !== "" ? value : null;
};

/** Every cited value of a document, in reading order. */
export function citedValuesOf(document: DocumentNode): CitedValueNode[] {
  return [...nodesOf(document)]
    .filter((node) => node.type === CITED_VALUE)
    .map((node) => ({
      recordId: textAttribute(node, "recordId") ?? "",
      versionId: textAttribute(node, "versionId") ?? "",
      field: textAttribute(node, "field") ?? "",
      text: textAttribute(node, "text") ?? "",
      keptReason: textAttribute(node, "keptReason"),
    }));
}

/** Record ids of the pictures shown as figures, in reading order. */
export function figureImageIdsOf(document: DocumentNode): string[] {
  return [...nodesOf(document)]
    .filter((node) => node.type === FIGURE)
    .map((node) => textAttribute(node, "imageId"))
    .filter((id) => id !== null);
}

/** Record ids of the traverses shown as charts, in reading order. */
export function chartTraverseIdsOf(document: DocumentNode): string[] {
  return [...nodesOf(document)]
    .filter((node) => node.type === CHART_FIGURE)
    .map((node) => textAttribute(node, "traverseId"))
    .filter((id) => id !== null);
}

/** Written text of a document, for counting and for the check that something was written. */
export function plainTextOf(document: DocumentNode): string {
  return [...nodesOf(document)]
    .map((node) => node.text ?? (node.type === CITED_VALUE ? String(node.attrs?.text ?? "") : ""))
    .join(" ")
    .replace(/\s+/g, " ")
    .trim();
}
