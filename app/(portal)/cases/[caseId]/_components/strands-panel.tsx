import Link from "next/link";
import { Panel, PanelHead } from "@/components/ui/panel";
import { Table, Td, Tr } from "@/components/ui/table";
import type { CaseOverview, OverviewQuote } from "@/lib/cases/case-overview";
import { routes } from "@/lib/routes";

function hrefOf(caseId: string, quote: OverviewQuote): string {
  switch (quote.kind) {
    case "field_return":
      return routes.fieldReturn(caseId);
    case "mark":
      return routes.image(caseId, quote.scopeId, quote.recordId);
    case "hardness_result":
      return routes.hardness(caseId);
    case "strength_statement":
      return routes.strength(caseId);
    default:
      return routes.weighing(caseId);
  }
}

/** The first values of each strand, each with the way to where it comes from. */
export function StrandsPanel({ overview }: { overview: CaseOverview }) {
  return (
    <Panel>
      <PanelHead
        title="What each strand says"
        actions={<Link href={routes.findings(overview.id)}>Findings</Link>}
      />
      {overview.quotes.length === 0 ? (
        <p className="px-3.5 py-3 text-13 text-ink-2">Nothing is measured or stated yet.</p>
      ) : (
        <Table caption="What each strand says">
          <tbody>
            {overview.quotes.map((quote, i) => (
              <Tr key={`${quote.recordId}-${quote.label}`}>
                <Td className="w-32 text-ink-2">
                  {quote.strand === overview.quotes[i - 1]?.strand ? "" : quote.strand}
                </Td>
                <Td>{quote.label}</Td>
                <Td numeric>
                  <Link
                    href={hrefOf(overview.id, quote)}
                    className="inline-flex items-baseline gap-1.5 rounded-2 border border-rule-2 bg-surface-2 px-1.5 text-12 leading-4.5 font-medium text-ink no-underline"
                  >
                    {quote.text}{" "}
                    <small className="font-mono text-11 font-normal text-ink-3">{quote.tag}</small>
                  </Link>
                </Td>
              </Tr>
            ))}
          </tbody>
        </Table>
      )}
    </Panel>
  );
}
