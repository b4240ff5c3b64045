import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";

/** Runs one of Debian's poppler-utils on a PDF and gives what it prints. */
export function poppler(
  tool: "pdfinfo" | "pdftotext" | "pdffonts" | "pdfimages",
  pdf: Buffer,
  args: string[] = [],
): string {
  const folder = mkdtempSync(path.join(tmpdir(), "report-"));
  try {
    const file = path.join(folder, "report.pdf");
    writeFileSync(file, pdf);
    const out = tool === "pdftotext" ? ["-"] : [];
    return execFileSync(tool, [...args, file, ...out], { encoding: "utf8", maxBuffer: 64e6 });
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** Text of every page in reading order, one string to a page. */
export function pageTexts(pdf: Buffer): string[] {
  return poppler("pdftotext", pdf, ["-raw"]).split("\f").slice(0, -1);
}
