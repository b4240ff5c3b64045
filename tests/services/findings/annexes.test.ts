import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { expect, it } from "vitest";
import { AppError } from "@/lib/errors";
import { readAnnexes } from "@/lib/findings/read-annexes";
import { draftPdf } from "@/lib/reports/draft-pdf";
import { asInvestigator, asRequester } from "../../helpers/people";
import { aWrittenCase } from "../../helpers/signable-case";

const flat = (text: string) => text.replace(/\s+/g, " ");

it("shows on the page, in the same order and words, the parts that the printed report adds", async () => {
  const caseId = await aWrittenCase();
  const investigator = await asInvestigator();
  const annexes = await readAnnexes(investigator, caseId);
  const folder = mkdtempSync(path.join(tmpdir(), "riverline-annexes-"));
  try {
    const file = path.join(folder, "draft.pdf");
    writeFileSync(file, (await draftPdf(investigator, caseId)).pdf);
    const printed = flat(execFileSync("pdftotext", ["-layout", file, "-"], { encoding: "utf8" }));
    const places = annexes.map(({ title }) => printed.indexOf(flat(title)));
    expect(places.every((place) => place >= 0)).toBe(true);
    expect(places).toEqual([...places].sort((a, b) => a - b));
    for (const block of annexes.flatMap(({ blocks }) => blocks)) {
      if (block.kind === "table") for (const cell of block.head) expect(printed).toContain(cell);
    }
  } finally {
    rmSync(folder, { recursive: true });
  }
  const items = annexes.find(({ title }) => title.includes("custody"))?.blocks;
  expect(JSON.stringify(items)).toContain("Shaft half");
  expect(annexes.some(({ title }) => title.includes("issues"))).toBe(true);
});

it("is not for the client", async () => {
  const caseId = await aWrittenCase();
  await expect(readAnnexes(await asRequester(), caseId)).rejects.toBeInstanceOf(AppError);
});
