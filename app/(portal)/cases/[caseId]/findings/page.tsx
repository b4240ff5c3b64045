import type { Metadata } from "next";
import { Suspense } from "react";
import { FindingsEditor } from "@/components/editor/findings-editor";
import { readFindings } from "@/lib/findings/read-findings";
import { orNotFound, pageActor } from "@/lib/http/page";
import { Annexes } from "./_components/annexes";
import { answerReaderNote, leaveReaderNote, returnReaderNote } from "./actions";

export const metadata: Metadata = { title: "Findings" };

export default async function FindingsPage({ params }: { params: Promise<{ caseId: string }> }) {
  const actor = await pageActor("case.viewWork");
  const { caseId } = await params;
  const { savedBy: _savedBy, noteActs, ...page } = await orNotFound(readFindings(actor, caseId));
  return (
    <FindingsEditor
      key={`${page.issueNumber}`}
      {...page}
      annexes={
        page.isSigned ? null : (
          <Suspense fallback={null}>
            <Annexes actor={actor} caseId={caseId} />
          </Suspense>
        )
      }
      noteActs={{
        mayLeave: noteActs.leave,
        mayAnswer: noteActs.answer,
        leave: leaveReaderNote,
        answer: answerReaderNote,
        giveBack: returnReaderNote,
      }}
    />
  );
}
