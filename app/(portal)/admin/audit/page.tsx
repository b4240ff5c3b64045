import type { Metadata } from "next";
import { PageHeader } from "@/components/frame/page-header";
import { Notice } from "@/components/ui/notice";
import { Table, Td, Th, Tr } from "@/components/ui/table";
import { listChains } from "@/lib/audit/list-chains";
import { formatDateTime } from "@/lib/format/dates";
import { formatCount } from "@/lib/format/numbers";
import { pageActor } from "@/lib/http/page";

export const metadata: Metadata = { title: "Audit log" };

export default async function AuditPage() {
  const actor = await pageActor("audit.verify");
  const { report, chains, checkedAt } = await listChains(actor);
  const first = report.faults[0];
  return (
    <main id="main" tabIndex={-1} className="pb-8">
      <PageHeader
        title="Audit log"
        note={`${formatCount(report.eventCount, "entry", "entries")} in ${formatCount(report.chainCount, "chain")}`}
      />
      <div className="px-4">
        {first ? (
          <Notice kind="bad" title={`${formatCount(report.faults.length, "chain")} does not fit`}>
            {first.says} Chain {first.chain}. Nothing was changed. Keep the database as it is and
            tell the people who run it.
          </Notice>
        ) : (
          <Notice kind="met" title="Every entry fits the one before">
            Checked {formatDateTime(checkedAt)}. The same check runs with{" "}
            <code className="font-mono text-12">npm run -s verify-audit</code>.
          </Notice>
        )}
        <Table caption="Chains of the audit log" boxClassName="mt-4">
          <thead>
            <tr>
              <Th>Chain</Th>
              <Th numeric>Entries</Th>
              <Th>Last entry</Th>
              <Th>Fingerprint of the last entry</Th>
            </tr>
          </thead>
          <tbody>
            {chains.map((chain) => (
              <Tr key={chain.chain}>
                <Td>{chain.name}</Td>
                <Td numeric>{chain.entries}</Td>
                <Td>{formatDateTime(chain.lastAt)}</Td>
                <Td>
                  <span className="font-mono text-12">{chain.fingerprint}</span>
                </Td>
              </Tr>
            ))}
          </tbody>
        </Table>
      </div>
    </main>
  );
}
