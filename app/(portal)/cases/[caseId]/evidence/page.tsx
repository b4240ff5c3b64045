import type { Metadata } from "next";
import { EmptyState } from "@/components/ui/empty-state";
import { Notice } from "@/components/ui/notice";
import { listItems } from "@/lib/evidence/list-items";
import { orNotFound, pageActor } from "@/lib/http/page";
import { ItemTree } from "./_components/item-tree";
import { ItemView } from "./_components/item-view";
import { RegisterDialog } from "./_components/register-dialog";

export const metadata: Metadata = { title: "Evidence" };

type Props = { params: Promise<{ caseId: string }>; searchParams: Promise<{ item?: string }> };

export default async function EvidencePage({ params, searchParams }: Props) {
  const actor = await pageActor("case.viewWork");
  const { caseId } = await params;
  const evidence = await orNotFound(listItems(actor, caseId));
  const chosenId = (await searchParams).item;
  const chosen = evidence.items.find((item) => item.id === chosenId) ?? evidence.items[0];
  const register = evidence.mayRegister ? (
    <RegisterDialog caseId={caseId} items={evidence.items} />
  ) : null;
  return (
    <div className="grid min-h-full md:grid-cols-[18rem_minmax(0,1fr)]">
      <section aria-label="Items" className="md:border-r border-rule-2 bg-surface">
        <div className="flex h-12 items-center justify-between border-b border-rule px-3.5">
          <h1 className="text-14 font-head">
            Evidence <span className="font-normal text-ink-3">{evidence.items.length}</span>
          </h1>
          {evidence.items.length > 0 && register}
        </div>
        <ItemTree caseId={caseId} items={evidence.items} chosenId={chosen?.id ?? null} />
      </section>
      <div className="min-w-0 bg-surface">
        {evidence.refusal && (
          <div className="p-4">
            <Notice kind="readonly" title="Read only">
              {evidence.refusal}
            </Notice>
          </div>
        )}
        {chosen ? (
          <ItemView
            caseId={caseId}
            item={chosen}
            parentLabel={evidence.items.find((item) => item.id === chosen.parentId)?.label ?? null}
            holders={evidence.holders}
            mayDescribe={evidence.mayRegister}
            mayHandOver={evidence.mayHandOver}
          />
        ) : (
          <EmptyState title="No items yet" action={register}>
            An item is anything that came in or was cut here. Each has a label that never changes
            and a chain of custody.
          </EmptyState>
        )}
      </div>
    </div>
  );
}
