import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { orNotFound, pageActor } from "@/lib/http/page";
import { routes } from "@/lib/routes";
import { listTraverses } from "@/lib/traverses/read-traverses";
import { TraverseAtWork } from "../_components/traverse-at-work";

export const metadata: Metadata = { title: "Hardness" };

type Props = { params: Promise<{ caseId: string; traverseId: string }> };

export default async function TraversePage({ params }: Props) {
  const actor = await pageActor("case.viewWork");
  const { caseId, traverseId } = await params;
  const station = await orNotFound(listTraverses(actor, caseId));
  const traverse = station.traverses.find((one) => one.traverseId === traverseId);
  if (!traverse) notFound();
  const { refusal } = station;
  const readOnlyBecause =
    refusal ?? (traverse.isVoid ? `${traverse.label} was withdrawn. Put it back to go on.` : null);
  return (
    <TraverseAtWork
      key={`${traverseId}-${readOnlyBecause ?? ""}`}
      caseId={caseId}
      traverse={traverse}
      caseNumber={station.caseNumber ?? "case"}
      others={station.traverses
        .filter((one) => one !== traverse && !one.isVoid)
        .map(({ label, content, result }) => ({ label, content, result }))}
      tabs={station.traverses.map((one) => ({
        href: routes.traverse(caseId, one.traverseId),
        label: one.label,
        name: one.content.name,
        state:
          one.result.unsettled.length > 0
            ? ("needs-attention" as const)
            : one.content.readings.length === 0
              ? ("under-way" as const)
              : ("complete" as const),
        isVoid: one.isVoid,
        current: one === traverse,
      }))}
      newHref={refusal === null ? routes.newTraverse(caseId) : null}
      proposal={station.proposal}
      enabledTableIds={station.enabledTableIds}
      items={station.items}
      readOnlyBecause={readOnlyBecause}
      withdrawnBecause={traverse.isVoid ? (traverse.voidReason ?? "") : null}
      mayChange={refusal === null}
    />
  );
}
