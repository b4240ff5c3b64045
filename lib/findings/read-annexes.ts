import "server-only";
import { database } from "@/db/client";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";
import { collectReport } from "@/lib/reports/collect-report";
import type { Block, Run } from "@/lib/reports/pdf/model";
import { reportModelOf } from "@/lib/reports/report-model";
import { findIssue } from "./find-issue";

/** A part of the report that the portal makes, in what a page can show. */
export type Annex = { title: string; blocks: AnnexBlock[] };
export type AnnexBlock =
  | { kind: "paragraph"; text: string }
  | { kind: "list"; items: string[] }
  | { kind: "table"; head: string[]; rows: string[][] };

const textOf = (runs: readonly Run[]) => runs.map((run) => run.text).join("");

function shown(block: Block): AnnexBlock {
  switch (block.kind) {
    case "paragraph":
      return { kind: "paragraph", text: textOf(block.runs) };
    case "list":
      return {
        kind: "list",
        items: block.items.map((item) =>
          item.map((part) => (part.kind === "paragraph" ? textOf(part.runs) : "")).join(" "),
        ),
      };
    case "table":
      return {
        kind: "table",
        head: block.head[0]?.map((cell) => textOf(cell.runs)) ?? [],
        rows: block.rows.map((row) => row.map((cell) => textOf(cell.runs))),
      };
    default:
      throw new Error(`an annex holds a ${block.kind}, which the findings page does not show`);
  }
}

/**
 * What the report says beside the written text, by the same code that prints it: items and custody,
 * what was supplied, tables used, gates, issues and versions as they stand now.
 * @throws AppError NOT_FOUND before the case is accepted
 */
export async function readAnnexes(actor: Actor, caseId: string): Promise<Annex[]> {
  const { row } = await getCase(actor, "case.viewWork", caseId);
  const issue = await findIssue(database(), caseId);
  if (!issue) throw notFound();
  const report = await collectReport(database(), row, issue, null);
  const { sections } = await reportModelOf(
    // The written text stands above; only what is added to it is wanted.
    { ...report, document: { type: "doc", content: [] } },
    { figure: () => Promise.reject(notFound()), fingerprint: null, draftRevision: issue.revision },
  );
  return sections.map(({ title, blocks }) => ({ title, blocks: blocks.map(shown) }));
}
