import type { Block, ReportModel, Run } from "@/lib/reports/pdf/model";

export function paragraph(...runs: (Run | string)[]): Block {
  return {
    kind: "paragraph",
    runs: runs.map((run) => (typeof run === "string" ? { text: run } : run)),
  };
}

export function cell(text: string) {
  return { runs: [{ text }] };
}

/** Text of about `lines` lines at full measure. */
export function filler(lines: number): Block[] {
  return Array.from({ length: lines }, (_, i) => paragraph(`Line ${i + 1} of text.`));
}

export function report(change: Partial<ReportModel> = {}): ReportModel {
  return {
    letterhead: { laboratoryName: "Calder Street Materials Laboratory", addressLine: "Unit 6" },
    caseNumber: "RL-2026-0142",
    issueNumber: 1,
    title: "Hoist drum shaft, broken at journal fillet",
    kicker: "Findings report, issue 1",
    facts: [
      { label: "For", text: "Harrow Bay Lifting Gear" },
      { label: "Received", text: "18 November 2026" },
      { label: "Part", text: "Drawing HB-2210 rev D" },
    ],
    answer: [paragraph("The shaft broke by bending fatigue.")],
    summary: [{ title: "What to do", blocks: [paragraph("Gauge the fillet.")] }],
    signatures: [
      { act: "Investigated by", name: "Idris Vale", at: "8 December 2026" },
      {
        act: "Signed by",
        name: "Mara Quist",
        role: "lead engineer",
        at: "9 December 2026, 10:14 UTC",
        decides: true,
      },
    ],
    sections: [],
    cautions: [{ text: "The results relate only to the items tested." }],
    fingerprint: "7d1e40c9b2f86a35".padEnd(64, "0"),
    createdAt: new Date("2026-12-09T10:14:00Z"),
    ...change,
  };
}

export function withBlocks(blocks: Block[], change: Partial<ReportModel> = {}): ReportModel {
  return report({ sections: [{ number: "1", title: "Hardness", blocks }], ...change });
}
