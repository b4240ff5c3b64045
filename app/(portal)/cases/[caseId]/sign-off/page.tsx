import type { Metadata } from "next";
import Link from "next/link";
import { PageHeader } from "@/components/frame/page-header";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { formatDateTime } from "@/lib/format/dates";
import { orNotFound, pageActor } from "@/lib/http/page";
import { ROLE_NAMES } from "@/lib/people/constants";
import { readSignOff } from "@/lib/reports/read-sign-off";
import { routes } from "@/lib/routes";
import { GateList } from "../_components/gate-list";
import { NewIssueDialog } from "./_components/new-issue-dialog";
import { ReaderPanel } from "./_components/reader-panel";
import { SendBackDialog } from "./_components/send-back-dialog";
import { SendButton } from "./_components/send-button";
import { SignDialog } from "./_components/sign-dialog";
import { StoringNotice } from "./_components/storing-notice";

export const metadata: Metadata = { title: "Sign-off" };

export default async function SignOffPage({ params }: { params: Promise<{ caseId: string }> }) {
  const actor = await pageActor("case.viewWork");
  const { caseId } = await params;
  const page = await orNotFound(readSignOff(actor, caseId, ROLE_NAMES[actor.role]));
  const { issue, acts, gates } = page;
  const met = gates.filter((gate) => gate.isMet).length;
  const isSigned = issue?.signedAt != null;
  return (
    <div className="pb-8">
      <PageHeader
        title="Sign-off"
        note={issue ? `Issue ${issue.number}, draft ${issue.revision}` : "No findings yet"}
        actions={
          issue && !isSigned ? (
            <LinkButton href={routes.api.draftPdf(caseId)} prefetch={false}>
              Print the draft
            </LinkButton>
          ) : null
        }
      />
      <div className="grid items-start gap-4 px-4 xl:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="grid min-w-0 content-start gap-3.5">
          {isSigned && issue && (
            <StoringNotice
              issueNumber={issue.number}
              signedAt={issue.signedAt ?? ""}
              releasedAt={issue.releasedAt}
              fingerprint={issue.fingerprint ?? ""}
              reportHref={routes.report(caseId)}
            />
          )}
          {page.state === "analysing" && page.lastNote && (
            <Notice kind="warn" title="Sent back with a note">
              {page.lastNote}
            </Notice>
          )}
          <Panel>
            <PanelHead
              title="Root cause"
              actions={<Link href={routes.findings(caseId)}>Findings</Link>}
            />
            <PanelBody>
              {issue?.rootCause ? (
                <p className="raw border-l-3 border-action pl-4 font-serif text-sheet">
                  {issue.rootCause}
                </p>
              ) : (
                <p className="text-13 text-ink-2">
                  Not written yet. It stands in one sentence at the head of the findings.
                </p>
              )}
            </PanelBody>
          </Panel>
          <ReaderPanel page={page} />
          <Panel>
            <PanelHead title="Signature" />
            <PanelBody>
              <div className="grid gap-3">
                <p className="text-13 text-ink-2">
                  The lead engineer signs, and is neither its author nor its second reader. Signing
                  locks the text, the figures and every value under it.
                </p>
                <div className="flex flex-wrap items-start gap-3">
                  {page.state !== "in_approval" && !isSigned && (
                    <SendButton caseId={caseId} disabledReason={acts.sendForSignOff.reason} />
                  )}
                  {page.state === "in_approval" && issue && (
                    <SignDialog page={page} disabledReason={acts.sign.reason} />
                  )}
                  {acts.sendBack.isOpen && <SendBackDialog caseId={caseId} />}
                  {acts.openNewIssue.isOpen && issue && (
                    <NewIssueDialog caseId={caseId} nextNumber={issue.number + 1} />
                  )}
                </div>
                <Notice kind="note" title="Before you sign.">
                  Findings rest on the pieces examined. They are no release for service and no
                  fitness-for-service statement. Where law asks for a licensed engineer, only that
                  person may approve.
                </Notice>
              </div>
            </PanelBody>
          </Panel>
        </div>
        <Panel>
          <PanelHead
            title="Gates"
            actions={<span className="text-ink-2">{`${met} of ${gates.length} met`}</span>}
          />
          <GateList gates={gates} />
          {issue?.signedAt && (
            <p className="px-3.5 py-2.5 text-12 text-ink-3">
              As they stand now; the report holds them as they stood on{" "}
              {formatDateTime(issue.signedAt)}.
            </p>
          )}
        </Panel>
      </div>
    </div>
  );
}
