import { describe, expect, it } from "vitest";
import { hardnessProfile } from "@/lib/charts/hardness-profile";
import type { DocumentNode } from "@/lib/findings/document";
import { UnknownDocumentPart, type DocumentResolver } from "@/lib/reports/pdf/document-resolver";
import { documentToBlocks, documentToSections } from "@/lib/reports/pdf/tiptap-to-blocks";
import { profileInput } from "../charts/profile-input";

const chart = hardnessProfile(profileInput({ theme: "paper" }));
const image = new Uint8Array([1, 2, 3]);

const resolver: DocumentResolver = {
  figure: (imageId) =>
    Promise.resolve({ image, widthPx: 10, heightPx: 5, alt: `picture ${imageId}` }),
  chart: () => Promise.resolve(chart),
};

function doc(...content: DocumentNode[]): DocumentNode {
  return { type: "doc", content };
}

function text(value: string, ...marks: DocumentNode["marks"] & object): DocumentNode {
  return { type: "text", text: value, marks };
}

function node(
  type: string,
  content: DocumentNode[] = [],
  attrs: Record<string, unknown> = {},
): DocumentNode {
  return { type, content, attrs };
}

const p = (...content: DocumentNode[]) => node("paragraph", content);
const link = (href: string) => ({ type: "link", attrs: { href } });

describe("a findings document as blocks", () => {
  it("keeps every mark and a break inside a paragraph", async () => {
    const [block] = await documentToBlocks(
      doc(
        p(
          text("a", { type: "bold" }, { type: "italic" }),
          node("hardBreak"),
          text("b", { type: "underline" }, { type: "strike" }),
          text("c", { type: "code" }),
          text("d", { type: "subscript" }),
          text("e", { type: "superscript" }),
          text("f", { type: "readerNote" }),
        ),
      ),
      resolver,
    );
    expect(block).toEqual({
      kind: "paragraph",
      runs: [
        { text: "a", bold: true, italic: true },
        { text: "\n" },
        { text: "b", underline: true, strike: true },
        { text: "c", mono: true },
        { text: "d", raised: "sub" },
        { text: "e", raised: "sup" },
        { text: "f" },
      ],
    });
  });

  it("keeps lists inside lists, headings, quotations, code and rules", async () => {
    const inner = node("orderedList", [node("listItem", [p(text("inner"))])], { start: 3 });
    const blocks = await documentToBlocks(
      doc(
        node("heading", [text("Head")], { level: 2 }),
        node("bulletList", [node("listItem", [p(text("outer")), inner])]),
        node("blockquote", [p(text("said"))]),
        node("codeBlock", [text("x = 1\n  y")]),
        node("horizontalRule"),
      ),
      resolver,
    );
    const inRuns = (value: string) => ({ kind: "paragraph", runs: [{ text: value }] });
    expect(blocks).toEqual([
      { kind: "heading", level: 2, runs: [{ text: "Head" }] },
      {
        kind: "list",
        ordered: false,
        items: [
          [inRuns("outer"), { kind: "list", ordered: true, start: 3, items: [[inRuns("inner")]] }],
        ],
      },
      { kind: "quote", blocks: [inRuns("said")] },
      { kind: "code", text: "x = 1\n  y" },
      { kind: "rule" },
    ]);
  });

  it("prints a cited value as kept, with the reason as its note", async () => {
    const attrs = { recordId: "r", versionId: "v", field: "depthMm", text: "1.94 ± 0.06 mm" };
    const [plain, kept] = await documentToBlocks(
      doc(
        p(node("citedValue", [], attrs)),
        p(node("citedValue", [], { ...attrs, keptReason: "Read on the same day." })),
      ),
      resolver,
    );
    expect(plain).toEqual({ kind: "paragraph", runs: [{ text: "1.94 ± 0.06 mm", cited: true }] });
    expect(kept).toMatchObject({
      runs: [
        { footnote: "This value has since changed and is kept as cited: Read on the same day." },
      ],
    });
  });

  it("asks for the frozen value where the caller has one, and shows a dash for none", async () => {
    const cited = p(node("citedValue", [], { recordId: "r", text: "old" }));
    const asked = { ...resolver, citedValue: () => Promise.resolve("frozen") };
    expect(await documentToBlocks(doc(cited), asked)).toMatchObject([
      { runs: [{ text: "frozen" }] },
    ]);
    const empty = p(node("citedValue", [], { recordId: "r", text: "" }));
    expect(await documentToBlocks(doc(empty), resolver)).toMatchObject([{ runs: [{ text: "–" }] }]);
  });

  it("prints where a link leads, once, and never an address that runs something", async () => {
    const [block] = await documentToBlocks(
      doc(
        p(
          text("the ", link("https://example.com/a")),
          text("rule", link("https://example.com/a"), { type: "bold" }),
          text(" and "),
          text("https://example.com/b", link("https://example.com/b")),
          text(" x", link("javascript:alert(1)")),
        ),
      ),
      resolver,
    );
    const runs = block?.kind === "paragraph" ? block.runs : [];
    expect(runs.map((run) => run.text).join("")).toBe(
      "the rule (https://example.com/a) and https://example.com/b x",
    );
  });

  it("numbers figures and charts in one order across documents", async () => {
    const numbering = { nextFigure: 2 };
    const first = doc(node("figure", [], { imageId: "IM-02", caption: "Face." }));
    const second = doc(node("chartFigure", [], { traverseId: "T2", caption: "Profile." }));
    expect(await documentToBlocks(first, resolver, numbering)).toEqual([
      {
        kind: "figure",
        number: 2,
        image,
        widthPx: 10,
        heightPx: 5,
        alt: "picture IM-02",
        caption: [{ text: "Face." }],
      },
    ]);
    expect(await documentToBlocks(second, resolver, numbering)).toEqual([
      { kind: "chart", number: 3, chart, caption: [{ text: "Profile." }] },
    ]);
  });

  it("keeps a table's head, its wide cells and the room under tall ones", async () => {
    const head = (value: string, attrs = {}) => node("tableHeader", [p(text(value))], attrs);
    const cell = (value: string, attrs = {}) => node("tableCell", [p(text(value))], attrs);
    const [table] = await documentToBlocks(
      doc(
        node("table", [
          node("tableRow", [head("A"), head("B", { colspan: 2 })]),
          node("tableRow", [cell("tall", { rowspan: 2 }), cell("1"), cell("2")]),
          node("tableRow", [cell("3"), cell("4")]),
        ]),
      ),
      resolver,
    );
    if (table?.kind !== "table") throw new Error("no table");
    const shown = (rows: typeof table.rows) =>
      rows.map((row) => row.map((one) => one.runs.map((run) => run.text).join("")));
    expect(table.columns).toHaveLength(3);
    expect(shown(table.head)).toEqual([["A", "B"]]);
    expect(table.head[0]?.[1]?.columnSpan).toBe(2);
    expect(shown(table.rows)).toEqual([
      ["tall", "1", "2"],
      ["", "3", "4"],
    ]);
  });

  it("splits at section headings and numbers those without a number", async () => {
    const { opening, sections } = await documentToSections(
      doc(
        p(text("before")),
        node("sectionHeading", [text("Answer")], { key: "answer" }),
        p(text("broke")),
        node("sectionHeading", [], { title: "Hardness", number: "4" }),
      ),
      resolver,
    );
    expect(opening).toHaveLength(1);
    expect(sections).toMatchObject([
      { key: "answer", number: "1", title: "Answer", blocks: [{ kind: "paragraph" }] },
      { number: "4", title: "Hardness", blocks: [] },
    ]);
  });

  it.each([
    ["a block", doc(node("video"))],
    ["an inline part", doc(p(node("mention")))],
    ["a part of a list", doc(node("bulletList", [p(text("x"))]))],
    [
      "a part of a table",
      doc(node("table", [node("tableRow", [node("tableCell", [node("video")])])])),
    ],
  ])("refuses %s that it cannot print, by name", async (_, document) => {
    const turning = documentToBlocks(document, resolver);
    await expect(turning).rejects.toThrow(UnknownDocumentPart);
    await expect(turning).rejects.toThrow("The text is kept. Take that part out");
  });

  it("passes on what the resolver says about a missing picture", async () => {
    const missing = { ...resolver, figure: () => Promise.reject(new Error("IM-09 is gone")) };
    const document = doc(node("figure", [], { imageId: "IM-09" }));
    await expect(documentToBlocks(document, missing)).rejects.toThrow("IM-09 is gone");
  });
});
