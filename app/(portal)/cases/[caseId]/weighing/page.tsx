import type { Metadata } from "next";
import { PageHeader } from "@/components/frame/page-header";
import { EmptyState } from "@/components/ui/empty-state";
import { Notice } from "@/components/ui/notice";
import { formatCount } from "@/lib/format/numbers";
import { orNotFound, pageActor } from "@/lib/http/page";
import { listMechanisms } from "@/lib/mechanisms/list-mechanisms";
import { MechanismPanel } from "./_components/mechanism-panel";
import { WeighDialog } from "./_components/weigh-dialog";

export const metadata: Metadata = { title: "Weighing" };

export default async function WeighingPage({ params }: { params: Promise<{ caseId: string }> }) {
  const actor = await pageActor("case.viewWork");
  const { caseId } = await params;
  const { mechanisms, refusal } = await orNotFound(listMechanisms(actor, caseId));
  const add = refusal === null ? <WeighDialog caseId={caseId} mechanism={null} /> : null;
  return (
    <div className="pb-8">
      <PageHeader
        title="Weighing"
        note={formatCount(mechanisms.length, "mechanism")}
        actions={mechanisms.length > 0 ? add : null}
      />
      <div className="grid gap-3.5 px-4">
        {refusal && (
          <Notice kind="readonly" title="Read only">
            {refusal}
          </Notice>
        )}
        {mechanisms.length === 0 ? (
          <div className="rounded-4 border border-rule-2 bg-surface">
            <EmptyState title="No mechanism is listed yet" action={add}>
              Write down every way it could have failed before you decide. One has to stand; each of
              the others needs the reason that speaks against it.
            </EmptyState>
          </div>
        ) : (
          mechanisms.map((mechanism) => (
            <MechanismPanel
              key={mechanism.recordId}
              caseId={caseId}
              mechanism={mechanism}
              isReadOnly={refusal !== null}
            />
          ))
        )}
        <p className="text-12 text-ink-3">
          Read the points against, not the sum of points for. A mechanism says how the metal failed;
          the cause says why, and needs its own proof.
        </p>
      </div>
    </div>
  );
}
