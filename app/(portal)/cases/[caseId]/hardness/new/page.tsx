import type { Metadata } from "next";
import { PageHeader } from "@/components/frame/page-header";
import { Notice } from "@/components/ui/notice";
import { Panel, PanelBody } from "@/components/ui/panel";
import { orNotFound, pageActor } from "@/lib/http/page";
import { tablesFor } from "@/lib/traverses/conversion-columns";
import { newTraverse } from "@/lib/traverses/new-traverse";
import { listTraverses } from "@/lib/traverses/read-traverses";
import { NewTraverseForm } from "../_components/new-traverse-form";

export const metadata: Metadata = { title: "New traverse" };

export default async function NewTraversePage({ params }: { params: Promise<{ caseId: string }> }) {
  const actor = await pageActor("case.viewWork");
  const { caseId } = await params;
  const station = await orNotFound(listTraverses(actor, caseId));
  const content = newTraverse(station.proposal);
  const enabled = new Set(station.enabledTableIds);
  const [tableId = null] = tablesFor(content.materialGroup, content.method, enabled);
  return (
    <>
      <PageHeader title="New traverse" note="Set up as the field return asks; all can be changed" />
      <Panel className="mx-4 max-w-text">
        <PanelBody>
          {station.refusal === null ? (
            <NewTraverseForm
              caseId={caseId}
              content={{ ...content, tableId }}
              items={station.items}
            />
          ) : (
            <Notice kind="readonly" title="Read only.">
              {station.refusal}
            </Notice>
          )}
        </PanelBody>
      </Panel>
    </>
  );
}
