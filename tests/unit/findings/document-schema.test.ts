import { describe, expect, it } from "vitest";
import {
  DOCUMENT_MAX_DEPTH,
  DOCUMENT_MAX_NODES,
  documentProblem,
  findingsDocument,
} from "@/lib/findings/document-schema";
import type { DocumentNode } from "@/lib/findings/document";
import { SECTIONS } from "@/lib/findings/sections";
import { startingDocument } from "@/lib/findings/starting-document";

const doc = (...content: unknown[]) => ({ type: "doc", content });
const text = (words: string, marks?: unknown[]) => ({
  type: "text",
  text: words,
  ...(marks && { marks }),
});
const paragraph = (...content: unknown[]) => ({ type: "paragraph", content });
const linked = (href: unknown) => doc(paragraph(text("here", [{ type: "link", attrs: { href } }])));
const head = (key: string) => ({ type: "sectionHeading", attrs: { key, title: key } });
const nested = (depth: number): unknown =>
  Array.from({ length: depth }).reduce<unknown>(
    (inner) => ({ type: "blockquote", content: [inner] }),
    paragraph(text("deep")),
  );

const problemOf = (document: unknown) => {
  const parsed = findingsDocument.safeParse(document);
  return parsed.success ? null : (parsed.error.issues[0]?.message ?? "");
};

describe("a findings document", () => {
  it("starts with every section in its order, and is a document", () => {
    const start = startingDocument();
    expect(problemOf(start)).toBeNull();
    expect(
      start.content
        ?.filter((node) => node.type === "sectionHeading")
        .map((node) => node.attrs?.key),
    ).toEqual(SECTIONS.map(({ key }) => key));
  });

  it("holds everything the toolbar makes", () => {
    const cell = (type: string) => ({
      type,
      attrs: { colspan: 1, rowspan: 1, colwidth: null },
      content: [paragraph(text("9"))],
    });
    const written: DocumentNode["content"] = [
      head("answer"),
      { type: "heading", attrs: { level: 2 }, content: [text("At the fillet")] },
      paragraph(
        text("R"),
        text("m", [{ type: "subscript" }]),
        text(" in "),
        text("bold", [{ type: "bold" }, { type: "italic" }]),
        { type: "hardBreak" },
        {
          type: "citedValue",
          attrs: {
            recordId: "rec_1",
            versionId: "ver_1",
            field: "caseDepth",
            text: "1.95 mm",
            tag: "T2",
            keptReason: null,
          },
        },
      ),
      {
        type: "orderedList",
        attrs: { start: 1, type: null },
        content: [{ type: "listItem", content: [paragraph(text("one"))] }],
      },
      {
        type: "table",
        content: [{ type: "tableRow", content: [cell("tableHeader"), cell("tableCell")] }],
      },
      { type: "figure", attrs: { imageId: "rec_2", caption: "", withMarks: false } },
      { type: "chartFigure", attrs: { traverseId: "rec_3", caption: "Hardness against depth" } },
    ] as DocumentNode["content"];
    expect(problemOf(doc(...(written ?? [])))).toBeNull();
  });

  it.each([
    [
      "a part that is not known",
      doc({ type: "iframe", attrs: { src: "https://example.test" } }),
      /do not have/,
    ],
    ["an own property of every object as a part", doc({ type: "constructor" }), /do not have/],
    ["a style that is not known", doc(paragraph(text("x", [{ type: "textStyle" }]))), /style/],
    [
      "an attribute that is not known",
      doc({ type: "paragraph", attrs: { onclick: "x()" } }),
      /not as it should be/,
    ],
    ["a heading of level 7", doc({ type: "heading", attrs: { level: 7 } }), /not as it should be/],
    [
      "a cell over 9999 columns",
      doc({ type: "tableCell", attrs: { colspan: 9999 } }),
      /not as it should be/,
    ],
    ["words outside a paragraph", doc(text("loose")), /where it cannot stand/],
    [
      "a table in a paragraph",
      doc(paragraph({ type: "table", content: [] })),
      /where it cannot stand/,
    ],
    ["words without words", doc(paragraph({ type: "text", text: "" })), /where it cannot stand/],
    [
      "a section that is not known",
      doc(head("verdict"), paragraph()),
      /section that findings do not have/,
    ],
    [
      "sections in another order",
      doc(head("scope"), paragraph(), head("answer"), paragraph()),
      /another order/,
    ],
    [
      "a section twice",
      doc(head("answer"), paragraph(), head("answer"), paragraph()),
      /another order/,
    ],
    ["a part on its own", paragraph(text("x")), /not a findings document/],
    ["a list in place of a document", [], /kind that findings hold/],
    ["nothing", null, /kind that findings hold/],
    ["a number", 7, /kind that findings hold/],
    ["lists without end", doc(nested(DOCUMENT_MAX_DEPTH + 1)), /nested too deeply/],
    ["quotes ten thousand deep", doc(nested(10_000)), /nested too deeply/],
    [
      "more parts than a report holds",
      doc(...Array.from({ length: DOCUMENT_MAX_NODES }, () => paragraph())),
      /more than 20000 parts/,
    ],
  ])("refuses %s", (_name, document, message) => {
    expect(problemOf(document)).toMatch(message);
  });

  it.each([
    "https://example.test/a",
    "http://example.test",
    "mailto:someone@example.test",
    "/cases/case_1",
  ])("takes a link to %s", (href) => expect(documentProblem(linked(href))).toBeNull());

  it.each([
    "javascript:alert(1)",
    "JaVaScRiPt:alert(1)",
    " javascript:alert(1)",
    "data:text/html,<script>alert(1)</script>",
    "vbscript:x",
    "file:///etc/passwd",
    "//example.test",
    "/\\example.test",
    "/\t/example.test",
    "",
    7,
    null,
  ])("refuses a link to %j", (href) => {
    expect(documentProblem(linked(href))).toBe("A link leads to a place that is not allowed.");
  });
});
