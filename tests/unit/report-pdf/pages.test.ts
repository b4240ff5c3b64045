import { describe, expect, it } from "vitest";
import sharp from "sharp";
import { STANDARD_CAUTIONS } from "@/lib/reports/pdf/cautions";
import type { Block, FigureBlock } from "@/lib/reports/pdf/model";
import { writeReportPdf } from "@/lib/reports/pdf/write-report";
import { pageTexts, poppler } from "./poppler";
import { cell, filler, paragraph, report, withBlocks } from "./sample-report";

async function picture(widthPx: number, heightPx: number): Promise<Buffer> {
  const create = { width: widthPx, height: heightPx, channels: 3, background: "#667" } as const;
  return sharp({ create }).jpeg().toBuffer();
}

function longTable(rows: number): Block {
  return {
    kind: "table",
    number: 1,
    caption: [{ text: "Readings" }],
    columns: [{ align: "left" }, { align: "right" }],
    head: [[cell("Number"), cell("Depth, mm")]],
    rows: Array.from({ length: rows }, (_, i) => [cell(`row${i + 1}`), cell((i / 100).toFixed(2))]),
  };
}

describe("pages of a report", () => {
  it("begins with the answer and ends by saying so", async () => {
    const { pdf, pageCount } = await writeReportPdf(withBlocks(filler(3)));
    const pages = pageTexts(pdf);
    expect(pages).toHaveLength(pageCount);
    const first = pages[0] ?? "";
    for (const text of [
      "Hoist drum shaft",
      "bending fatigue",
      "Gauge the fillet",
      "Mara Quist, lead engineer",
    ]) {
      expect(first).toContain(text);
    }
    expect(first).not.toContain("Line 1 of text");
    expect(pages.at(-1)).toContain("End of report RL-2026-0142, issue 1.");
    expect(pages.at(-1)).toContain("7d1e40c9b2f86a35");
  });

  it("carries case, issue, fingerprint and page of pages on every page", async () => {
    const { pdf } = await writeReportPdf(withBlocks(filler(120)));
    const pages = pageTexts(pdf);
    expect(pages.length).toBeGreaterThan(3);
    pages.forEach((text, index) => {
      expect(text).toContain("RL-2026-0142, issue 1");
      expect(text).toContain("Fingerprint 7d1e 40c9 b2f8 6a35");
      expect(text).toContain(`Page ${index + 1} of ${pages.length}`);
    });
  });

  it("says on every page of a draft that it is not signed", async () => {
    const draft = {
      draft: { label: "Draft 7, not signed" },
      kicker: "Findings report",
      fingerprint: undefined,
      signatures: [],
    };
    const { pdf } = await writeReportPdf(withBlocks(filler(60), draft));
    for (const text of pageTexts(pdf)) {
      expect(text.split("Draft 7, not signed").length - 1).toBeGreaterThanOrEqual(2);
      expect(text).not.toContain("Fingerprint");
      expect(text).not.toContain("issue 1");
    }
  });

  it("prints the standing cautions in full, the first of them on the first page too", async () => {
    const { pdf } = await writeReportPdf(report({ cautions: [...STANDARD_CAUTIONS] }));
    const flat = (text: string) => text.replace(/\s+/g, " ");
    const pages = pageTexts(pdf).map(flat);
    for (const { text } of STANDARD_CAUTIONS) expect(pages.join(" ")).toContain(flat(text));
    expect(pages[0]).toContain(flat(STANDARD_CAUTIONS[0]?.text ?? "missing"));
  });

  it("repeats the head of a table on each of its pages and keeps every row once, in order", async () => {
    const { pdf } = await writeReportPdf(withBlocks([longTable(1000)]));
    const pages = pageTexts(pdf).filter((text) => /row\d/.test(text));
    expect(pages.length).toBeGreaterThan(20);
    for (const text of pages) expect(text).toContain("Number Depth, mm");
    const rows = [...pages.join("").matchAll(/row(\d+)/g)].map((match) => Number(match[1]));
    expect(rows).toEqual(Array.from({ length: 1000 }, (_, i) => i + 1));
  });

  it("cuts a row that is taller than a page over pages and loses nothing", async () => {
    const words = Array.from({ length: 3000 }, (_, i) => `w${i}`);
    const table: Block = {
      kind: "table",
      columns: [{ align: "left" }, { align: "left" }],
      head: [[cell("Text"), cell("Note")]],
      rows: [[cell(words.join(" ")), cell("x")]],
    };
    const { pdf } = await writeReportPdf(withBlocks([table]));
    const found = [
      ...pageTexts(pdf)
        .join(" ")
        .matchAll(/\bw(\d+)\b/g),
    ].map((match) => `w${match[1]}`);
    expect(found).toEqual(words);
  });

  it.each([18, 20, 22, 24, 26, 27, 28, 29, 30, 31])(
    "never parts a heading from its text, nor a figure from its caption (%i lines above)",
    async (lines) => {
      const figure: FigureBlock = {
        kind: "figure",
        number: 2,
        image: await picture(600, 200),
        widthPx: 600,
        heightPx: 200,
        alt: "Section",
        caption: [{ text: "Caption of the section." }],
      };
      const blocks: Block[] = [
        ...filler(lines),
        { kind: "heading", level: 1, runs: [{ text: "A heading" }] },
        paragraph("Text under the heading. ".repeat(12)),
        figure,
      ];
      const { pdf } = await writeReportPdf(withBlocks(blocks));
      const pages = pageTexts(pdf);
      const heading = pages.findIndex((text) => text.includes("A heading"));
      expect(pages[heading]).toContain("Text under the heading.");
      const caption = pages.findIndex((text) => text.includes("Caption of the section."));
      const list = poppler("pdfimages", pdf, ["-list"]).trim().split("\n").slice(2);
      expect(list.map((line) => Number(line.trim().split(/\s+/)[0]))).toEqual([caption + 1]);
    },
  );

  it("prints the reason for a value kept as cited at the foot of its own page", async () => {
    const kept = { text: "1.94 ± 0.06 mm", cited: true, footnote: "Kept for the reason given." };
    const blocks = [...filler(27), paragraph("The depth is ", kept, "."), ...filler(40)];
    const { pdf } = await writeReportPdf(withBlocks(blocks));
    const page = pageTexts(pdf).find((text) => text.includes("1.94"));
    expect(page).toContain("Kept for the reason given.");
    expect(page).not.toContain("Page 1 of");
  });

  it("carries a note longer than a page's foot on to the next pages", async () => {
    const footnote = Array.from({ length: 1500 }, (_, i) => `n${i}`).join(" ");
    const { pdf } = await writeReportPdf(withBlocks([paragraph({ text: "Depth", footnote })]));
    const found = [
      ...pageTexts(pdf)
        .join(" ")
        .matchAll(/\bn(\d+)\b/g),
    ].map((match) => Number(match[1]));
    expect(found).toEqual(Array.from({ length: 1500 }, (_, i) => i));
  });

  it("lets an answer that is longer than a page run on", async () => {
    const { pdf } = await writeReportPdf(report({ answer: filler(90) }));
    const pages = pageTexts(pdf);
    expect(pages.join("")).toContain("Line 90 of text.");
    expect(pages.join("")).toContain("Mara Quist");
  });
});
