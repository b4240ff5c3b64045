import type { Metadata } from "next";
import Link from "next/link";
import { Panel, PanelHead } from "@/components/ui/panel";
import { decide } from "@/lib/auth/policy";
import { caseOverview } from "@/lib/cases/case-overview";
import { seatChoices } from "@/lib/cases/seat-choices";
import { orNotFound, pageActor } from "@/lib/http/page";
import { routes } from "@/lib/routes";
import { redirect } from "next/navigation";
import { ActivityPanel } from "./_components/activity-panel";
import { GatePanel } from "./_components/gate-panel";
import { PartPanel } from "./_components/part-panel";
import { ProgressPanel } from "./_components/progress-panel";
import { QuestionsPanel } from "./_components/questions-panel";
import { ReportPanel } from "./_components/report-panel";
import { StandingNotices } from "./_components/standing-notices";
import { TriagePanel } from "./_components/triage-panel";
import { StrandsPanel } from "./_components/strands-panel";

export const metadata: Metadata = { title: "Overview" };

export default async function OverviewPage({ params }: { params: Promise<{ caseId: string }> }) {
  const actor = await pageActor("case.view");
  const { caseId } = await params;
  const overview = await orNotFound(caseOverview(actor, caseId));
  if (overview.state === "draft") redirect(routes.fieldReturn(caseId));
  const may = (action: Parameters<typeof decide>[1]) =>
    decide(actor, action, overview.subject).allowed;
  const seesWork = may("case.viewWork");
  const rights = {
    accept: may("case.accept"),
    askBack: may("case.askBack"),
    decline: may("case.decline"),
    cancel: may("case.cancel"),
    assign: may("case.assign"),
    hold: may("case.hold"),
    clearHold: may("case.clearHold"),
  };
  const seats = rights.assign
    ? await seatChoices()
    : { lead: [], investigator: [], secondReader: [], technician: [] };
  const now = new Date();
  return (
    <div className="p-4">
      <h1 className="sr-only">Overview</h1>
      <StandingNotices overview={overview} />
      <div className="grid gap-4 xl:grid-cols-[minmax(0,1fr)_24rem] xl:grid-rows-[auto_1fr] 3xl:grid-cols-[minmax(0,1fr)_24rem_22rem] 3xl:grid-rows-1">
        <div className="grid min-w-0 content-start gap-3.5 xl:row-span-2 3xl:row-span-1">
          <PartPanel overview={overview} mayRead={may("case.viewFieldReturn")} />
          {seesWork && <StrandsPanel overview={overview} />}
          <QuestionsPanel overview={overview} />
          <ProgressPanel
            moves={overview.moves}
            dueOn={overview.dueOn}
            lead={overview.people.lead}
            now={now}
          />
        </div>
        <div className="grid min-w-0 content-start gap-3.5">
          {overview.issues.length > 0 && (
            <ReportPanel overview={overview} mayRead={may("report.read")} />
          )}
          <TriagePanel overview={overview} rights={rights} seats={seats} />
          {seesWork && <GatePanel gates={overview.gates} signOffHref={routes.signOff(caseId)} />}
        </div>
        <div className="min-w-0">
          {may("case.viewHistory") ? (
            <ActivityPanel
              activity={overview.activity}
              historyHref={routes.history(caseId)}
              now={now}
            />
          ) : (
            <Panel>
              <PanelHead title="People" />
              <p className="px-3.5 py-3 text-13 text-ink-2">
                {overview.people.investigator
                  ? `${overview.people.investigator} investigates, ${overview.people.lead ?? "the lead engineer"} signs.`
                  : "The laboratory has not named an investigator yet."}{" "}
                <Link href={routes.cases()}>All your cases</Link>
              </p>
            </Panel>
          )}
        </div>
      </div>
    </div>
  );
}
