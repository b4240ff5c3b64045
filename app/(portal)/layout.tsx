import { SessionEndWarning } from "@/components/frame/session-end-warning";
import { FindField } from "@/components/frame/find-field";
import { SkipLink } from "@/components/frame/skip-link";
import { TopBar } from "@/components/frame/top-bar";
import { Toasts } from "@/components/ui/toasts";
import { decide } from "@/lib/auth/policy";
import { currentDeadlines } from "@/lib/auth/session";
import { pageActor } from "@/lib/http/page";
import { ROLE_NAMES } from "@/lib/people/constants";
import { routes } from "@/lib/routes";
import { signOut } from "./actions";

const WARN_BEFORE_MS = 2 * 60_000;

/** The frame of every signed-in page. A convenience: pages and verbs ask the policy themselves. */
export default async function PortalLayout({ children }: { children: React.ReactNode }) {
  const actor = await pageActor("self.view");
  const deadlines = await currentDeadlines();
  const may = (action: Parameters<typeof decide>[1]) => decide(actor, action).allowed;
  const endsAfterMs = deadlines?.endsInMs ?? 0;
  return (
    <Toasts>
      <SkipLink />
      <TopBar
        homeHref={routes.cases()}
        items={[
          { href: routes.cases(), label: "Cases" },
          ...(may("reference.view") && actor.organisationKind === "laboratory"
            ? [{ href: routes.reference(), label: "Reference" }]
            : []),
        ]}
        person={{
          name: actor.name,
          roleName: `${ROLE_NAMES[actor.role]}, ${actor.organisationName}`,
        }}
        links={[
          { href: routes.me(), label: "Your account" },
          ...(may("person.view") ? [{ href: routes.people(), label: "People" }] : []),
          ...(may("audit.verify") ? [{ href: routes.audit(), label: "Audit log" }] : []),
        ]}
        search={<FindField />}
        signOut={signOut}
      />
      <SessionEndWarning
        warnAfterMs={Math.max(0, endsAfterMs - WARN_BEFORE_MS)}
        endsAfterMs={endsAfterMs}
        signInHref={routes.signIn()}
      />
      {children}
    </Toasts>
  );
}
