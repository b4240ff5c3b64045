import { contentDisposition } from "@/lib/http/file-response";
import { route } from "@/lib/http/route";
import { draftPdf } from "@/lib/reports/draft-pdf";

/** The findings as they stand, as a draft. */
export const GET = route<{ caseId: string }>(
  { permission: "report.preview" },
  async ({ actor, params }) => {
    const { pdf, fileName } = await draftPdf(actor, params.caseId);
    return new Response(new Uint8Array(pdf), {
      headers: {
        "content-type": "application/pdf",
        "content-disposition": contentDisposition("inline", fileName),
        "cache-control": "private, no-store",
      },
    });
  },
);
