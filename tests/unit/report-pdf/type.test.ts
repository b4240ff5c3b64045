import { describe, expect, it } from "vitest";
import { face } from "@/lib/reports/pdf/faces";
import { readCoverage } from "@/lib/reports/pdf/font-coverage";
import { writeReportPdf } from "@/lib/reports/pdf/write-report";
import { pageTexts, poppler } from "./poppler";
import { cell, paragraph, withBlocks } from "./sample-report";

const SIGNS = [..."≥≤≈√∞→₁₂µ±×²°·−½ΔσΩØ⌀éüłŽ", ..."≠←–—“”‘’•…³"];
const LINE = SIGNS.join(" ");

describe("type in a report", () => {
  const everywhere = withBlocks(
    [
      paragraph(`serif ${LINE}`),
      paragraph({ text: `bold ${LINE}`, bold: true }),
      paragraph({ text: `italic ${LINE}`, italic: true }),
      paragraph({ text: `both ${LINE}`, bold: true, italic: true }),
      paragraph({ text: `raised ${LINE}`, raised: "sup" }),
      { kind: "code", text: `mono ${LINE}` },
      { kind: "heading", level: 1, runs: [{ text: `head ${LINE}` }] },
      {
        kind: "table",
        columns: [{ align: "left" }],
        head: [[cell(`column ${LINE}`)]],
        rows: [[cell(`cell ${LINE}`)]],
      },
    ],
    { title: `title ${LINE}` },
  );

  it("sets every sign of the trade as itself, in every style, from embedded faces alone", async () => {
    const { pdf, warnings } = await writeReportPdf(everywhere);
    expect(warnings).toEqual([]);
    const fonts = poppler("pdffonts", pdf).trim().split("\n").slice(2);
    expect(fonts.length).toBeGreaterThan(5);
    for (const font of fonts) {
      expect(font).not.toMatch(/Helvetica|Arial|Times|Courier/);
      // Columns emb, sub and uni: embedded, cut to what is used, with a map back to text.
      expect(font).toMatch(/Identity-H\s+yes yes yes/);
    }
    const text = poppler("pdftotext", pdf).replace(/\s+/g, " ");
    const lead = [
      "title",
      "serif",
      "bold",
      "italic",
      "both",
      "raised",
      "mono",
      "head",
      "column",
      "cell",
    ];
    for (const word of lead) {
      const [, after = ""] = text.split(`${word} ${SIGNS[0]}`, 2);
      const shown = (SIGNS[0] + after).replaceAll(" ", "").slice(0, SIGNS.length);
      expect(shown, word).toBe(SIGNS.join(""));
    }
  });

  it("shows a box for a sign that no face has, keeps its neighbours and says so", async () => {
    const blocks = [paragraph("before[鋼🔩ש]after"), paragraph({ text: "x鋼y", mono: true })];
    const { pdf, warnings } = await writeReportPdf(withBlocks(blocks));
    expect(warnings).toHaveLength(1);
    for (const code of ["U+92FC", "U+1F529", "U+05E9"]) expect(warnings[0]).toContain(code);
    const text = pageTexts(pdf).join("");
    const between = /before\[(.*)\]after/s.exec(text)?.[1]?.replace(/\s/g, "");
    expect(["", "鋼🔩ש"]).toContain(between);
  });

  it("takes out what hides or reorders text and joins accents to their letters", async () => {
    const hostile = "safe\u202Egnp.exe\u202C \u0000\u0007zero\u200Bwidth\uFEFF e\u0301 \uD800 end";
    const { pdf } = await writeReportPdf(withBlocks([paragraph(hostile)]));
    const text = pageTexts(pdf).join("");
    expect(text).toContain("safegnp.exe zerowidth é");
    expect(text).toContain("end");
  });

  it("breaks words that are wider than the page and keeps them whole when copied", async () => {
    const word = "x".repeat(1200);
    const blocks = [
      paragraph(word),
      paragraph({ text: "m".repeat(400), mono: true }),
      {
        kind: "table" as const,
        columns: [{ align: "left" as const }, { align: "left" as const }],
        head: [],
        rows: [[cell("y".repeat(300)), cell("short")]],
      },
    ];
    const { pdf } = await writeReportPdf(withBlocks(blocks));
    const box = poppler("pdftotext", pdf, ["-bbox"]);
    const right = [...box.matchAll(/xMax="([\d.]+)"/g)].map((match) => Number(match[1]));
    expect(right.length).toBeGreaterThan(20);
    expect(Math.max(...right)).toBeLessThanOrEqual(595.28 - 53.8 + 1);
    const xs = pageTexts(pdf)
      .join("\n")
      .split("\n")
      .filter((line) => /^x+\s*$/.test(line));
    expect(xs.length).toBeGreaterThan(3);
    expect(xs.map((line) => line.trim()).join("")).toBe(word);
  });
});

describe("coverage of a face", () => {
  it("knows what a face has and has not", () => {
    expect(face("serif").coverage.has("A".codePointAt(0) ?? 0)).toBe(true);
    expect(face("serif").coverage.has(0x2265)).toBe(false);
    expect(face("math").coverage.has(0x2265)).toBe(true);
    expect(face("sans").coverage.has(0x92fc)).toBe(false);
  });

  it("refuses a file without a character map it can read", () => {
    expect(() => readCoverage(new Uint8Array(64))).toThrow("The face has no table cmap.");
  });
});
