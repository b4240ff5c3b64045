import type { Metadata } from "next";
import { PageHeader } from "@/components/frame/page-header";
import { Notice } from "@/components/ui/notice";
import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { Table, Td, Th, Tr } from "@/components/ui/table";
import { OriginShape } from "@/components/ui/value";
import { formatDateTime } from "@/lib/format/dates";
import { orNotFound, pageActor } from "@/lib/http/page";
import { readStrength } from "@/lib/strength/read-strength";
import { StrengthForm } from "./_components/strength-form";

export const metadata: Metadata = { title: "Strength" };

export default async function StrengthPage({ params }: { params: Promise<{ caseId: string }> }) {
  const actor = await pageActor("case.viewWork");
  const { caseId } = await params;
  const data = await orNotFound(readStrength(actor, caseId));
  return (
    <div className="pb-8">
      <PageHeader title="Strength" note="Do hardness, structure, tests and drawing say the same?" />
      <div className="grid gap-4 px-4 xl:grid-cols-2">
        <Panel>
          <PanelHead title="Values side by side" />
          {data.sources.length === 0 ? (
            <p className="px-3.5 py-3 text-13 text-ink-2">
              No hardness is measured and nothing is asked by the drawing yet.
            </p>
          ) : (
            <Table caption="Values that bear on strength">
              <thead>
                <tr>
                  <Th>What</Th>
                  <Th numeric>Value</Th>
                  <Th>From</Th>
                </tr>
              </thead>
              <tbody>
                {data.sources.map((source) => (
                  <Tr key={`${source.versionId}-${source.field}`}>
                    <Td>{source.label}</Td>
                    <Td numeric>
                      <OriginShape origin={source.source} /> {source.text}
                    </Td>
                    <Td className="font-mono text-12 text-ink-3">{source.tag}</Td>
                  </Tr>
                ))}
              </tbody>
            </Table>
          )}
          <p className="border-t border-rule px-3.5 py-2.5 text-12 text-ink-3">
            A strength converted from hardness is an estimate and does not replace a tensile test.
          </p>
        </Panel>
        <Panel>
          <PanelHead
            title="Statement"
            note={
              data.statement
                ? `${data.statement.by}, ${formatDateTime(data.statement.at)}`
                : "None yet"
            }
          />
          <PanelBody>
            {data.refusal && (
              <Notice kind="readonly" title="Read only">
                {data.refusal}
              </Notice>
            )}
            <StrengthForm
              key={data.statement?.version ?? 0}
              caseId={caseId}
              statement={
                data.statement
                  ? { ...data.statement.content, version: data.statement.version }
                  : null
              }
              isReadOnly={data.refusal !== null}
            />
          </PanelBody>
        </Panel>
      </div>
    </div>
  );
}
