import type { Metadata } from "next";
import { PageHeader } from "@/components/frame/page-header";
import { MAIN_ID } from "@/components/frame/skip-link";
import { listChoices } from "@/lib/cases/list-choices";
import { pageActor } from "@/lib/http/page";
import { StartForm } from "./_components/start-form";

export const metadata: Metadata = { title: "Open a case" };

export default async function NewCasePage() {
  const actor = await pageActor("case.create");
  const { clients } = await listChoices(actor);
  return (
    <main id={MAIN_ID} tabIndex={-1} className="max-w-text pb-8">
      <PageHeader title="Open a case" note={actor.organisationName} />
      <div className="px-4">
        <StartForm clients={clients} />
      </div>
    </main>
  );
}
