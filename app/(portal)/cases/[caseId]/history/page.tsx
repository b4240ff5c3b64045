import type { Metadata } from "next";
import Link from "next/link";
import { PageHeader } from "@/components/frame/page-header";
import { Notice } from "@/components/ui/notice";
import { Table, Td, Th, Tr } from "@/components/ui/table";
import { caseHistory } from "@/lib/audit/case-history";
import { formatDateTime } from "@/lib/format/dates";
import { formatCount } from "@/lib/format/numbers";
import { orNotFound, pageActor } from "@/lib/http/page";
import { ROLE_NAMES } from "@/lib/people/constants";
import { routes } from "@/lib/routes";
import { HistoryChange } from "./_components/history-change";

export const metadata: Metadata = { title: "History" };

type Props = { params: Promise<{ caseId: string }>; searchParams: Promise<{ before?: string }> };

export default async function HistoryPage({ params, searchParams }: Props) {
  const actor = await pageActor("case.viewHistory");
  const { caseId } = await params;
  const before = Number((await searchParams).before);
  const history = await orNotFound(
    caseHistory(actor, caseId, Number.isInteger(before) && before > 0 ? before : null),
  );
  return (
    <div className="pb-8">
      <PageHeader title="History" note={formatCount(history.total, "entry", "entries")} />
      <div className="px-4">
        {history.fault ? (
          <Notice kind="bad" title="The chain of entries does not fit">
            {history.fault} Nothing was changed. Tell the administrator.
          </Notice>
        ) : (
          <Notice kind="met" title="Unbroken">
            Each entry is sealed to the one before; all {history.total} fit.
          </Notice>
        )}
        <Table caption="What was done to this case, newest first" boxClassName="mt-4">
          <thead>
            <tr>
              <Th numeric>No.</Th>
              <Th>When</Th>
              <Th>Who</Th>
              <Th>What</Th>
              <Th>Before and after</Th>
              <Th>Seal</Th>
            </tr>
          </thead>
          <tbody>
            {history.entries.map((entry) => (
              <Tr key={entry.position} className="align-top [&>td]:py-1.5">
                <Td numeric>{entry.position}</Td>
                <Td className="tn whitespace-nowrap">{formatDateTime(entry.at)}</Td>
                <Td className="whitespace-nowrap">
                  {entry.who}
                  <span className="block text-12 text-ink-3">
                    {entry.role ? ROLE_NAMES[entry.role] : "by itself"}
                  </span>
                </Td>
                <Td>{entry.what}</Td>
                <Td>
                  <HistoryChange change={entry.change} before={entry.before} after={entry.after} />
                </Td>
                <Td className="font-mono text-12 text-ink-3">{entry.seal}</Td>
              </Tr>
            ))}
          </tbody>
        </Table>
        {history.nextBefore !== null && (
          <p className="mt-3 text-13">
            <Link href={`${routes.history(caseId)}?before=${history.nextBefore}`}>
              Earlier entries
            </Link>
          </p>
        )}
      </div>
    </div>
  );
}
