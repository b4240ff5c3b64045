import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { PageHeader } from "@/components/frame/page-header";
import { EmptyState } from "@/components/ui/empty-state";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { orNotFound, pageActor } from "@/lib/http/page";
import { routes } from "@/lib/routes";
import { listTraverses } from "@/lib/traverses/read-traverses";

export const metadata: Metadata = { title: "Hardness" };

export default async function HardnessPage({ params }: { params: Promise<{ caseId: string }> }) {
  const actor = await pageActor("case.viewWork");
  const { caseId } = await params;
  const station = await orNotFound(listTraverses(actor, caseId));
  const first = station.traverses.find(({ isVoid }) => !isVoid) ?? station.traverses[0];
  if (first) redirect(routes.traverse(caseId, first.traverseId));
  return (
    <>
      <PageHeader title="Hardness" note="Traverses, profiles and conversions" />
      <Panel className="mx-4">
        {station.refusal === null ? null : (
          <Notice kind="readonly" title="Read only." className="m-3.5">
            {station.refusal}
          </Notice>
        )}
        <EmptyState
          title="No traverse yet"
          action={
            station.refusal === null ? (
              <LinkButton href={routes.newTraverse(caseId)} look="primary">
                Start a traverse
              </LinkButton>
            ) : null
          }
        >
          A traverse is a row of indents from the surface inwards. Type the readings or paste them
          as a block; hardness, depth and conversions are worked out beside them.
        </EmptyState>
      </Panel>
    </>
  );
}
