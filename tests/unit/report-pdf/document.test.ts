import { describe, expect, it } from "vitest";
import sharp from "sharp";
import { hardnessProfile } from "@/lib/charts/hardness-profile";
import { AppError } from "@/lib/errors";
import type { FigureBlock } from "@/lib/reports/pdf/model";
import { writeReportPdf } from "@/lib/reports/pdf/write-report";
import { profileInput } from "../charts/profile-input";
import { poppler } from "./poppler";
import { cell, paragraph, withBlocks } from "./sample-report";

function figure(image: Uint8Array, alt = "Fracture face"): FigureBlock {
  return {
    kind: "figure",
    number: 2,
    image,
    widthPx: 300,
    heightPx: 200,
    alt,
    caption: [{ text: "Face." }],
  };
}

function canvas(channels: 3 | 4) {
  const background = { r: 90, g: 90, b: 90, alpha: 0.5 };
  return sharp({ create: { width: 300, height: 200, channels, background } });
}

describe("a report as a document", () => {
  const chart = hardnessProfile(profileInput({ theme: "paper" }));

  it("is tagged: headings, paragraphs, lists, tables with heads, figures with text", async () => {
    const model = withBlocks([
      { kind: "heading", level: 1, runs: [{ text: "Profile" }] },
      { kind: "list", ordered: true, items: [[paragraph("First")], [paragraph("Second")]] },
      {
        kind: "table",
        columns: [{ align: "left" }],
        head: [[cell("HV1")]],
        rows: [[cell("627")]],
      },
      figure(await canvas(3).jpeg().toBuffer()),
      { kind: "chart", number: 3, chart, caption: [{ text: "Hardness against depth." }] },
    ]);
    const { pdf } = await writeReportPdf(model);
    const tree = poppler("pdfinfo", pdf, ["-struct"]);
    for (const tag of [
      "H1",
      "H2",
      "H3",
      "P",
      "L",
      "LI",
      "Lbl",
      "LBody",
      "Table",
      "THead",
      "TBody",
      "TR",
      "TH",
      "TD",
      "Figure",
      "Caption",
    ]) {
      expect(tree, tag).toMatch(new RegExp(`^\\s*${tag}\\b`, "m"));
    }
    const raw = pdf.toString("latin1");
    expect(raw).toContain("/Alt (Fracture face)");
    expect(raw.match(/\/S \/Figure/g)).toHaveLength(2);
    expect(raw.match(/\/S \/Figure\n\/Alt/g)).toHaveLength(2);
  });

  it("reads words of neighbouring lines apart", async () => {
    const { pdf } = await writeReportPdf(withBlocks([paragraph("alpha beta ".repeat(60))]));
    const text = poppler("pdfinfo", pdf, ["-struct-text"]);
    expect(text).not.toMatch(/alphabeta|betaalpha/);
  });

  it("says its language and title, opens with the title, and has bookmarks", async () => {
    const { pdf } = await writeReportPdf(withBlocks([paragraph("Text")]));
    const info = poppler("pdfinfo", pdf);
    expect(info).toMatch(/Title:\s+RL-2026-0142: Hoist drum shaft, broken at journal fillet/);
    expect(info).toMatch(/Tagged:\s+yes/);
    expect(info).toMatch(/Page size:\s+595.28 x 841.89 pts \(A4\)/);
    expect(info).toMatch(/CreationDate:.*2026/);
    const raw = pdf.toString("latin1");
    expect(raw).toContain("/Lang (en)");
    expect(raw).toContain("/DisplayDocTitle true");
    expect(raw).toContain("/Title (1 Hardness)");
  });

  it("gives the same bytes for the same model, pictures with alpha included", async () => {
    const model = withBlocks([
      figure(await canvas(4).png().toBuffer()),
      { kind: "chart", chart, caption: [] },
    ]);
    const [first, second] = [await writeReportPdf(model), await writeReportPdf(model)];
    expect(first.pdf.equals(second.pdf)).toBe(true);
  });

  it("draws charts as vectors with their words as text", async () => {
    const { pdf } = await writeReportPdf(withBlocks([{ kind: "chart", chart, caption: [] }]));
    const text = poppler("pdftotext", pdf);
    for (const word of [
      "SHD 1.95 ± 0.06",
      "limit 448 HV1 = 80 % of 560",
      "required 2.5 to 4.0 mm",
    ]) {
      expect(text).toContain(word);
    }
    expect(poppler("pdfimages", pdf, ["-list"]).trim().split("\n")).toHaveLength(2);
  });

  it("keeps a plain JPEG byte for byte", async () => {
    const jpeg = await canvas(3).jpeg().toBuffer();
    const { pdf } = await writeReportPdf(withBlocks([figure(jpeg)]));
    expect(pdf.includes(jpeg)).toBe(true);
  });

  it.each([
    ["16 bit PNG", () => canvas(3).toColourspace("rgb16").png().toBuffer()],
    ["grey PNG", () => canvas(3).greyscale().png().toBuffer()],
    ["CMYK JPEG", () => canvas(3).toColourspace("cmyk").jpeg().toBuffer()],
    ["turned JPEG", () => canvas(3).withMetadata({ orientation: 6 }).jpeg().toBuffer()],
    ["interlaced PNG", () => canvas(4).png({ progressive: true }).toBuffer()],
  ])("takes a %s", async (_, make) => {
    const { pdf } = await writeReportPdf(withBlocks([figure(await make())]));
    const [line = ""] = poppler("pdfimages", pdf, ["-list"]).trim().split("\n").slice(2);
    expect(line).toMatch(/\b(rgb|gray)\s+[13]\s+8\b/);
    expect(line).not.toContain("cmyk");
  });

  it.each([
    ["nothing", new Uint8Array()],
    ["text", Buffer.from("not a picture")],
    ["an SVG with a wrong size", Buffer.from("<svg")],
  ])("refuses %s as a picture and says what to do", async (_, image) => {
    const writing = writeReportPdf(withBlocks([figure(image)]));
    await expect(writing).rejects.toThrow(AppError);
    await expect(writing).rejects.toThrow(
      "The picture of Figure 2 cannot be read. The text is kept. Put the picture in again",
    );
  });

  it("keeps brackets and backslashes of titles out of the file's own syntax", async () => {
    const title = "Shaft \\) /Title (x) ] >> endobj ±";
    const { pdf } = await writeReportPdf(withBlocks([paragraph(title)], { title }));
    expect(poppler("pdfinfo", pdf)).toContain(title);
    expect(poppler("pdftotext", pdf)).toContain(title);
  });
});
