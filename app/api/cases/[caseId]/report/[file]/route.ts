import { notFound } from "@/lib/errors";
import { contentDisposition, streamResponse } from "@/lib/http/file-response";
import { route } from "@/lib/http/route";
import { openReportPdf } from "@/lib/reports/open-report-pdf";

/** The PDF of a released issue: /report/2.pdf. */
export const GET = route<{ caseId: string; file: string }>(
  { permission: "report.read" },
  async ({ actor, request, params }) => {
    const issueNumber = /^([1-9]\d{0,3})\.pdf$/.exec(params.file)?.[1];
    if (!issueNumber) throw notFound();
    const pdf = await openReportPdf(actor, params.caseId, Number(issueNumber));
    const isInline = new URL(request.url).searchParams.has("view");
    return streamResponse(pdf.body, {
      "content-type": "application/pdf",
      "content-length": String(pdf.sizeBytes),
      "content-disposition": contentDisposition(isInline ? "inline" : "attachment", pdf.fileName),
      "cache-control": "private, no-cache",
      etag: `"${pdf.sha256}"`,
    });
  },
);
