import type { Metadata } from "next";
import { PageHeader } from "@/components/frame/page-header";
import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { pageActor } from "@/lib/http/page";
import { listOrganisations, listPeople } from "@/lib/people/list-people";
import { AddClientForm } from "./_components/add-client-form";
import { InviteForm } from "./_components/invite-form";
import { PeopleTable } from "./_components/people-table";

export const metadata: Metadata = { title: "People" };

export default async function PeoplePage() {
  const actor = await pageActor("person.view");
  const [people, organisations] = await Promise.all([listPeople(actor), listOrganisations(actor)]);
  return (
    <main id="main" tabIndex={-1} className="pb-8">
      <PageHeader
        title="People"
        note={`${people.length} in ${organisations.length} organisations`}
      />
      <div className="grid gap-4 px-4 xl:grid-cols-[minmax(0,1fr)_20rem]">
        <PeopleTable people={people} ownId={actor.id} />
        <div className="grid content-start gap-4">
          <Panel>
            <PanelHead title="Invite someone" />
            <PanelBody>
              <InviteForm organisations={organisations} />
            </PanelBody>
          </Panel>
          <Panel>
            <PanelHead title="Add a client" />
            <PanelBody>
              <AddClientForm />
            </PanelBody>
          </Panel>
        </div>
      </div>
    </main>
  );
}
