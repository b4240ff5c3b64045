import type { Metadata } from "next";
import Link from "next/link";
import { PageHeader } from "@/components/frame/page-header";
import { Facts } from "@/components/ui/facts";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { formatDate, formatDateTime } from "@/lib/format/dates";
import { formatBytes } from "@/lib/format/numbers";
import { orNotFound, pageActor } from "@/lib/http/page";
import { readReport } from "@/lib/reports/read-report";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "Report" };

type Props = { params: Promise<{ caseId: string }>; searchParams: Promise<{ issue?: string }> };

export default async function ReportPage({ params, searchParams }: Props) {
  const actor = await pageActor("report.read");
  const { caseId } = await params;
  const asked = Number((await searchParams).issue);
  const { issue, others, frozen } = await orNotFound(
    readReport(actor, caseId, Number.isInteger(asked) && asked > 0 ? asked : null),
  );
  const pdf = routes.api.reportPdf(caseId, issue.number);
  return (
    <div className="pb-8">
      <PageHeader
        title="Report"
        note={`Issue ${issue.number}, signed ${formatDate(issue.signedAt)}`}
        actions={
          <>
            <LinkButton href={`${pdf}?view`} prefetch={false} target="_blank">
              Open the PDF
            </LinkButton>
            <LinkButton href={pdf} prefetch={false} look="primary">
              Download the PDF
            </LinkButton>
          </>
        }
      />
      <div className="grid gap-4 px-4 xl:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="grid min-w-0 content-start gap-3.5">
          {issue.state === "superseded" && (
            <Notice kind="warn" title="A later issue replaces this one">
              Do not use issue {issue.number} any more.
            </Notice>
          )}
          <article className="mx-auto w-full max-w-sheet bg-paper px-8 py-10 text-paper-ink sm:px-18">
            <p className="text-13 text-paper-ink-2">
              Findings report, issue {issue.number}, signed {formatDate(issue.signedAt)}
            </p>
            <h2 className="mt-1 font-serif text-24 font-head">{frozen.title}</h2>
            <dl className="mt-4 grid grid-cols-[6rem_minmax(0,1fr)] gap-y-1 border-y border-paper-rule py-2 text-13">
              {frozen.facts.map((fact) => (
                <div key={fact.label} className="contents">
                  <dt className="text-paper-ink-2">{fact.label}</dt>
                  <dd>{fact.text}</dd>
                </div>
              ))}
            </dl>
            <section className="mt-5 border-l-3 border-action pl-4">
              <h3 className="text-13 font-head text-action">Answer</h3>
              <p className="raw mt-1 font-serif text-sheet">{frozen.rootCause}</p>
            </section>
            <p className="mt-5 text-13 text-paper-ink-2">
              Investigated by {frozen.investigatedBy?.name ?? "–"}, read by{" "}
              {frozen.readBy?.name ?? "–"}, signed by {frozen.signedBy?.name ?? "–"},{" "}
              {frozen.signedBy?.role.toLowerCase()}.
            </p>
            <p className="mt-3 text-13">
              The whole report, with figures, tables and the versions it rests on, is in the PDF.
            </p>
          </article>
          <Notice kind="warn" title="Before you act on it">
            Findings rest on the pieces examined. Do not return a part, sister part or fleet to
            service on this evidence alone; that decision belongs to the responsible engineer and
            the rules that apply. This is no fitness-for-service, airworthiness, pressure or
            structural release.
          </Notice>
        </div>
        <div className="grid content-start gap-3.5">
          <Panel>
            <PanelHead title={`Issue ${issue.number}`} />
            <PanelBody>
              <Facts
                facts={[
                  { name: "Signed", value: formatDateTime(issue.signedAt) },
                  { name: "Released", value: formatDateTime(issue.releasedAt) },
                  { name: "Rests on", value: `${frozen.manifest.length} versions` },
                  { name: "File", value: formatBytes(issue.pdfSizeBytes) },
                ]}
              />
              <p className="mt-3 text-12 text-ink-3">Fingerprint of the content</p>
              <p className="font-mono text-12 break-all">{issue.fingerprint}</p>
              <p className="mt-2 text-12 text-ink-3">SHA-256 of the PDF</p>
              <p className="font-mono text-12 break-all">{issue.pdfSha256}</p>
            </PanelBody>
          </Panel>
          {others.length > 0 && (
            <Panel>
              <PanelHead title="Other issues" />
              <ul className="px-3.5 py-1.5 text-13">
                {others.map((other) => (
                  <li key={other.number} className="py-1">
                    <Link href={routes.report(caseId, other.number)}>
                      Issue {other.number}, signed {formatDate(other.signedAt)}
                    </Link>
                    {other.reason && <span className="raw block text-ink-3">{other.reason}</span>}
                  </li>
                ))}
              </ul>
            </Panel>
          )}
        </div>
      </div>
    </div>
  );
}
