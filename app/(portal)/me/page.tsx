import type { Metadata } from "next";
import { PageHeader } from "@/components/frame/page-header";
import { Facts } from "@/components/ui/facts";
import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { pageActor } from "@/lib/http/page";
import { ROLE_NAMES } from "@/lib/people/constants";
import { OwnPasswordForm } from "./_components/own-password-form";

export const metadata: Metadata = { title: "Your account" };

export default async function MePage() {
  const actor = await pageActor("self.view");
  return (
    <main id="main" tabIndex={-1} className="max-w-text pb-8">
      <PageHeader title="Your account" />
      <div className="grid gap-4 px-4">
        <Panel>
          <PanelHead title={actor.name} />
          <PanelBody>
            <Facts
              facts={[
                { name: "E-mail", value: actor.email },
                { name: "Role", value: ROLE_NAMES[actor.role] },
                { name: "Organisation", value: actor.organisationName },
              ]}
            />
          </PanelBody>
        </Panel>
        <Panel>
          <PanelHead title="Change your password" />
          <PanelBody>
            <OwnPasswordForm />
          </PanelBody>
        </Panel>
      </div>
    </main>
  );
}
