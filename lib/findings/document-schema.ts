import { z } from "zod";
import { CHART_FIGURE, CITED_VALUE, type DocumentNode, FIGURE, SECTION_HEADING } from "./document";
import { structureProblem } from "./document-structure";

export const DOCUMENT_MAX_BYTES = 2 * 1024 * 1024;
export const DOCUMENT_MAX_NODES = 20_000;
export const DOCUMENT_MAX_DEPTH = 40;
export const CAPTION_MAX = 500;
export const ROOT_CAUSE_MAX = 500;

const id = z.string().min(1).max(40);
const text = (max: number) => z.string().max(max);
const none = z.strictObject({}).optional();

/** Attributes each node may have; a node that is not here is refused. */
const NODE_ATTRIBUTES: Record<string, z.ZodType> = {
  doc: none,
  paragraph: none,
  heading: z.strictObject({ level: z.union([z.literal(1), z.literal(2), z.literal(3)]) }),
  bulletList: none,
  orderedList: z
    .strictObject({
      start: z.number().int().min(0).max(9999).optional(),
      type: z.string().max(2).nullish(),
    })
    .optional(),
  listItem: none,
  blockquote: none,
  codeBlock: z.strictObject({ language: z.string().max(40).nullish() }).optional(),
  horizontalRule: none,
  hardBreak: none,
  text: none,
  table: none,
  tableRow: none,
  tableHeader: cellAttributes(),
  tableCell: cellAttributes(),
  [SECTION_HEADING]: z.strictObject({ key: text(40), title: text(120) }),
  [FIGURE]: z.strictObject({
    imageId: id,
    caption: text(CAPTION_MAX),
    withMarks: z.boolean().optional(),
  }),
  [CHART_FIGURE]: z.strictObject({ traverseId: id, caption: text(CAPTION_MAX) }),
  [CITED_VALUE]: z.strictObject({
    recordId: id,
    versionId: id,
    field: text(60),
    text: text(300),
    tag: text(60),
    keptReason: text(CAPTION_MAX).nullish(),
  }),
};

function cellAttributes() {
  const span = z.number().int().min(1).max(50);
  return z
    .strictObject({
      colspan: span.optional(),
      rowspan: span.optional(),
      colwidth: z.array(z.number().int().min(0).max(5000)).max(50).nullish(),
      align: z.string().max(10).nullish(),
    })
    .optional();
}

/** Links lead to the web, to mail, or to a place in the portal; never to a script. */
const href = z
  .string()
  .max(2000)
  .refine(
    (value) => /^(https?:|mailto:)/i.test(value) || /^\/(?![/\\\s])/.test(value),
    "A link begins with http://, https:// or mailto:.",
  );

const MARK_ATTRIBUTES: Record<string, z.ZodType> = {
  bold: none,
  italic: none,
  underline: none,
  strike: none,
  code: none,
  subscript: none,
  superscript: none,
  link: z.object({ href }),
};

/** What is wrong with a document, in words; null when nothing is. */
export function documentProblem(value: unknown): string | null {
  let count = 0;
  const look = (node: unknown, depth: number): string | null => {
    count += 1;
    if (count > DOCUMENT_MAX_NODES) return `The text has more than ${DOCUMENT_MAX_NODES} parts.`;
    if (depth > DOCUMENT_MAX_DEPTH) return "Lists or quotes are nested too deeply.";
    const shape = nodeShape.safeParse(node);
    if (!shape.success) return "A part of the text is not of a kind that findings hold.";
    const { type, attrs, marks, content } = shape.data;
    const attributes = Object.hasOwn(NODE_ATTRIBUTES, type) ? NODE_ATTRIBUTES[type] : undefined;
    if (!attributes)
      return `The text holds a part that findings do not have ("${type.slice(0, 40)}").`;
    if (!attributes.safeParse(withoutEmpty(attrs)).success)
      return `A part of the text ("${type}") is not as it should be.`;
    for (const mark of marks ?? []) {
      const known = Object.hasOwn(MARK_ATTRIBUTES, mark.type)
        ? MARK_ATTRIBUTES[mark.type]
        : undefined;
      const parsed = known?.safeParse(withoutEmpty(mark.attrs));
      if (!parsed?.success)
        return mark.type === "link"
          ? "A link leads to a place that is not allowed."
          : `The text has a style that findings do not have ("${mark.type.slice(0, 40)}").`;
    }
    for (const child of content ?? []) {
      const problem = look(child, depth + 1);
      if (problem) return problem;
    }
    return null;
  };
  return look(value, 0);
}

const nodeShape = z.object({
  type: z.string().max(60),
  attrs: z.record(z.string(), z.unknown()).optional(),
  content: z.array(z.unknown()).optional(),
  marks: z
    .array(
      z.object({ type: z.string().max(60), attrs: z.record(z.string(), z.unknown()).optional() }),
    )
    .max(20)
    .optional(),
  text: z.string().optional(),
});

function withoutEmpty(
  attrs: Record<string, unknown> | undefined,
): Record<string, unknown> | undefined {
  if (!attrs) return undefined;
  const kept = Object.entries(attrs).filter(([, value]) => value !== undefined && value !== null);
  return kept.length === 0 ? undefined : Object.fromEntries(kept);
}

function isDocument(value: unknown): value is DocumentNode {
  return z.object({ type: z.literal("doc") }).safeParse(value).success;
}

/** A whole findings document, every node, mark and attribute of a known kind and in its place. */
export const findingsDocument = z.unknown().transform((value, context): DocumentNode => {
  const problem = documentProblem(value);
  if (problem === null && isDocument(value)) {
    const misplaced = structureProblem(value);
    if (misplaced === null) return value;
    context.addIssue({ code: "custom", message: misplaced });
    return z.NEVER;
  }
  context.addIssue({ code: "custom", message: problem ?? "This is not a findings document." });
  return z.NEVER;
});

export const SaveFindingsInput = z.object({
  caseId: z.string().max(40),
  /** Revision of the draft that the person saw. */
  revision: z.number().int(),
  document: findingsDocument,
  rootCause: z
    .string()
    .trim()
    .max(ROOT_CAUSE_MAX, `The root cause is one sentence of at most ${ROOT_CAUSE_MAX} characters.`),
});
