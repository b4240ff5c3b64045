import type { Metadata } from "next";
import { orNotFound, pageActor } from "@/lib/http/page";
import { readFieldReturn } from "@/lib/intake/read-field-return";
import { DraftForm } from "./_components/draft-form";
import { SentReturn } from "./_components/sent-return";

export const metadata: Metadata = { title: "Field return" };

export default async function FieldReturnPage({ params }: { params: Promise<{ caseId: string }> }) {
  const actor = await pageActor("case.viewFieldReturn");
  const { caseId } = await params;
  const page = await orNotFound(readFieldReturn(actor, caseId));
  return page.mayEdit ? <DraftForm page={page} /> : <SentReturn page={page} />;
}
