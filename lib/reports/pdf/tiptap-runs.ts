import "server-only";
import { DASH } from "@/lib/format/marks";
import { CITED_VALUE, citedValuesOf, type DocumentNode } from "@/lib/findings/document";
import { UnknownDocumentPart, type DocumentResolver } from "./document-resolver";
import type { Run } from "./model";

/** Inline content of a node as runs. */
export async function inlineRuns(
  nodes: readonly DocumentNode[],
  resolver: DocumentResolver,
): Promise<Run[]> {
  const runs: Run[] = [];
  for (const [index, node] of nodes.entries()) {
    if (node.type === "text") {
      runs.push(styled(node, node.text ?? ""));
      const target = linkOf(node);
      const goesOn = target !== null && linkOf(nodes[index + 1]) === target;
      // Paper has no links to follow, so the address is printed where the text does not show it.
      if (target !== null && !goesOn && node.text !== target) runs.push({ text: ` (${target})` });
    } else if (node.type === "hardBreak") {
      runs.push({ text: "\n" });
    } else if (node.type === CITED_VALUE) {
      runs.push(await citedRun(node, resolver));
    } else {
      throw new UnknownDocumentPart(node.type);
    }
  }
  return runs;
}

async function citedRun(node: DocumentNode, resolver: DocumentResolver): Promise<Run> {
  const [cited] = citedValuesOf(node);
  if (!cited) throw new UnknownDocumentPart(node.type);
  const text = (await resolver.citedValue?.(cited)) ?? cited.text;
  return {
    ...styled(node, text === "" ? DASH : text),
    cited: true,
    ...(cited.keptReason && {
      footnote: `This value has since changed and is kept as cited: ${cited.keptReason}`,
    }),
  };
}

/** Marks that carry no text (a reader's note, a highlight) are not printed. */
function styled(node: DocumentNode, text: string): Run {
  const has = (mark: string) => (node.marks ?? []).some(({ type }) => type === mark);
  return {
    text,
    ...(has("bold") && { bold: true }),
    ...(has("italic") && { italic: true }),
    ...(has("underline") && { underline: true }),
    ...(has("strike") && { strike: true }),
    ...(has("code") && { mono: true }),
    ...(has("subscript") && { raised: "sub" as const }),
    ...(has("superscript") && { raised: "sup" as const }),
  };
}

function linkOf(node: DocumentNode | undefined): string | null {
  const href = node?.marks?.find(({ type }) => type === "link")?.attrs?.href;
  return typeof href === "string" && /^(https?:|mailto:)/i.test(href) ? href : null;
}
