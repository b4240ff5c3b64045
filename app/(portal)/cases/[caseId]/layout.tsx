import { CaseBar } from "@/components/frame/case-bar";
import { CaseSpine } from "@/components/frame/case-spine";
import { MAIN_ID } from "@/components/frame/skip-link";
import { caseFrame } from "@/lib/cases/case-frame";
import { orNotFound, pageActor } from "@/lib/http/page";
import { routes } from "@/lib/routes";

type Props = { children: React.ReactNode; params: Promise<{ caseId: string }> };

export default async function CaseLayout({ children, params }: Props) {
  const actor = await pageActor("case.view");
  const { caseId } = await params;
  const frame = await orNotFound(caseFrame(actor, caseId));
  // A draft is one form with a spine of its own.
  if (frame.state === "draft") return children;
  return (
    <>
      <CaseBar
        number={frame.number}
        href={routes.case(caseId)}
        title={frame.title}
        client={frame.client}
        state={frame.state}
        onHold={frame.isOnHold}
        due={frame.dueOn ?? undefined}
      />
      <div className="flex min-h-[calc(100dvh-6.5rem)]">
        <CaseSpine nodes={frame.strands} rootCause={frame.rootCause} />
        <main id={MAIN_ID} tabIndex={-1} className="min-w-0 flex-1">
          {children}
        </main>
      </div>
    </>
  );
}
