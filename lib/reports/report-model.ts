import "server-only";
import { citedValuesOf } from "@/lib/findings/document";
import { formatDate } from "@/lib/format/dates";
import { AppError } from "@/lib/errors";
import { RECORD_KIND_NAMES } from "@/lib/records/constants";
import type { FrozenReport } from "./frozen-report";
import { STANDARD_CAUTIONS } from "./pdf/cautions";
import type { DocumentResolver } from "./pdf/document-resolver";
import type {
  Block,
  ReportModel,
  ReportSection,
  ReportSignature,
  Run,
  TableBlock,
} from "./pdf/model";
import { documentToSections } from "./pdf/tiptap-to-blocks";

const run = (text: string): Run[] => [{ text }];
const paragraph = (text: string): Block => ({ kind: "paragraph", runs: run(text) });

function table(
  head: string[],
  rows: readonly string[][],
  align: ("left" | "right")[] = [],
): TableBlock {
  const cells = (texts: readonly string[]) => texts.map((text) => ({ runs: run(text) }));
  return {
    kind: "table",
    columns: head.map((_title, i) => ({ align: align[i] ?? "left" })),
    head: [cells(head)],
    rows: rows.map(cells),
  };
}

function annexes(frozen: FrozenReport): ReportSection[] {
  const sections: [string, Block[]][] = [
    [
      "Annex: items and custody",
      frozen.items.length === 0
        ? [paragraph("No item is registered.")]
        : [
            paragraph(
              "Results relate only to the items listed. Condition as received, in the words of those who unpacked them.",
            ),
            table(
              ["Item", "What it is", "Condition", "Received", "Now at", "Entries"],
              frozen.items,
              ["left", "left", "left", "left", "left", "right"],
            ),
          ],
    ],
    [
      "Annex: as supplied by the owner, not verified",
      [
        frozen.supplied.length === 0
          ? paragraph("Nothing was stated.")
          : table(["What", "As stated"], frozen.supplied),
      ],
    ],
    [
      "Annex: what nobody knew",
      frozen.unknowns.length === 0
        ? [paragraph("Every question of the field return was answered.")]
        : [
            {
              kind: "list",
              ordered: false,
              items: frozen.unknowns.map((text) => [paragraph(text)]),
            },
          ],
    ],
    [
      "Annex: hardness conversions",
      frozen.conversions.length === 0
        ? [paragraph("No hardness was measured.")]
        : [
            table(["Traverse", "Where", "Table and edition"], frozen.conversions),
            paragraph(
              "A converted value is an approximation for the named material group. It does not replace the specified test, and it never decides a requirement stated in another scale.",
            ),
          ],
    ],
    ["Annex: gates before signature", [table(["No.", "Gate", "State", "Detail"], frozen.gates)]],
    ["Annex: issues of this report", [table(["Issue", "Signed", "Reason"], frozen.issues)]],
    [
      "Annex: versions this report rests on",
      frozen.manifest.length === 0
        ? [paragraph("No value is cited and no figure is shown.")]
        : [
            table(
              ["What", "Version", "SHA-256"],
              frozen.manifest.map((entry) => [
                `${entry.label} ${RECORD_KIND_NAMES[entry.kind].toLowerCase()}`,
                String(entry.version),
                entry.sha256,
              ]),
              ["left", "right", "left"],
            ),
          ],
    ],
  ];
  return sections.map(([title, blocks]) => ({ title, blocks }));
}

function signaturesOf(frozen: FrozenReport): ReportSignature[] {
  const signature = (
    act: string,
    person: FrozenReport["signedBy"],
    more: Partial<ReportSignature>,
  ): ReportSignature[] =>
    person ? [{ act, name: person.name, role: person.role, at: person.at, ...more }] : [];
  return [
    ...signature("Investigated by", frozen.investigatedBy, {
      meaning: "Examined the items and wrote this report.",
    }),
    ...signature("Read by", frozen.readBy, { meaning: "Read it as second reader." }),
    ...signature("Signed by", frozen.signedBy, {
      meaning: "Answers for it. Locked at this time.",
      decides: true,
    }),
  ];
}

/** Kept values of another day are told in the limitations, each with the reason. */
function keptNotes(frozen: FrozenReport): Block[] {
  const kept = citedValuesOf(frozen.document).filter((value) => value.keptReason !== null);
  if (kept.length === 0) return [];
  return [
    paragraph("Cited values kept as they were although their source changed later:"),
    {
      kind: "list",
      ordered: false,
      items: kept.map((value) => [paragraph(`${value.text}: ${value.keptReason}`)]),
    },
  ];
}

/**
 * The report ready to print. `figure` brings the pictures with their marks drawn in; everything
 * else comes from the frozen content.
 */
export async function reportModelOf(
  frozen: FrozenReport,
  how: {
    figure: DocumentResolver["figure"];
    fingerprint: string | null;
    draftRevision: number | null;
  },
): Promise<ReportModel> {
  const { sections } = await documentToSections(
    frozen.document,
    {
      figure: how.figure,
      chart: (traverseId) => {
        const chart = frozen.charts[traverseId];
        if (!chart)
          throw new AppError("INVALID", "A chart of the findings is not among what was kept.");
        return Promise.resolve(chart);
      },
    },
    { nextFigure: 1 },
  );
  const answer = sections.find((section) => section.key === "answer");
  const body = sections.filter(
    (section) => section.key !== "answer" && section.blocks.some(hasWords),
  );
  const limitations = body.find((section) => section.key === "limitations");
  limitations?.blocks.push(...keptNotes(frozen));
  const signedOn = frozen.signedBy ? `, signed ${formatDate(frozen.at)}` : "";
  return {
    letterhead: {
      laboratoryName: frozen.laboratory.name,
      addressLine: frozen.laboratory.addressLine,
    },
    caseNumber: frozen.caseNumber,
    issueNumber: frozen.issueNumber,
    title: frozen.title,
    kicker: `Findings report, issue ${frozen.issueNumber}${signedOn}`,
    ...(how.draftRevision !== null && {
      draft: { label: `Draft ${how.draftRevision}, not signed` },
    }),
    facts: frozen.facts,
    answer: [
      ...(frozen.rootCause
        ? [{ kind: "paragraph", runs: [{ text: frozen.rootCause, bold: true }] } satisfies Block]
        : []),
      ...(answer?.blocks.filter(hasWords) ?? []),
    ],
    summary: frozen.sameHandsNote
      ? [{ title: "Note", blocks: [paragraph(frozen.sameHandsNote)] }]
      : [],
    signatures: signaturesOf(frozen),
    sections: [
      ...body.map((section, i) => ({ ...section, number: String(i + 1) })),
      ...annexes(frozen),
    ],
    cautions: [...STANDARD_CAUTIONS],
    ...(how.fingerprint !== null && { fingerprint: how.fingerprint }),
    createdAt: new Date(frozen.at),
  };
}

function hasWords(block: Block): boolean {
  return block.kind !== "paragraph" || block.runs.some((part) => part.text.trim() !== "");
}
