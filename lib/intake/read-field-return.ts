import "server-only";
import { asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { caseQuestions, organisations, people } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { decide } from "@/lib/auth/policy";
import type { CaseState } from "@/lib/cases/constants";
import { earlierReturns, type EarlierReturn } from "@/lib/cases/earlier-returns";
import { getCase } from "@/lib/cases/get-case";
import { loadAnswers } from "@/lib/cases/load-answers";
import { listRequestFiles, type RequestFile } from "@/lib/uploads/request-files";
import type { Answers } from "./answers";

export type FieldReturnPage = {
  caseId: string;
  number: string | null;
  state: CaseState;
  client: string;
  answers: Answers;
  revision: number;
  savedAt: string;
  mayEdit: boolean;
  mayAnswer: boolean;
  mayAddFiles: string | null;
  questions: { id: string; question: string; askedBy: string; answer: string | null }[];
  files: RequestFile[];
  earlier: EarlierReturn[];
};

/** A field return for its page: being filled in, waiting for answers, or sent. */
export async function readFieldReturn(actor: Actor, caseId: string): Promise<FieldReturnPage> {
  const { row, subject } = await getCase(actor, "case.viewFieldReturn", caseId);
  const [draft, [client], questions, files, earlier] = await Promise.all([
    loadAnswers(database(), caseId),
    database()
      .select({ name: organisations.name })
      .from(organisations)
      .where(eq(organisations.id, row.organisationId)),
    database()
      .select({
        id: caseQuestions.id,
        question: caseQuestions.question,
        answer: caseQuestions.answer,
        askedBy: people.name,
      })
      .from(caseQuestions)
      .innerJoin(people, eq(people.id, caseQuestions.askedById))
      .where(eq(caseQuestions.caseId, caseId))
      .orderBy(asc(caseQuestions.askedAt)),
    listRequestFiles(actor, caseId),
    earlierReturns(actor, row),
  ]);
  const addFiles = decide(actor, "case.addRequestFile", subject);
  return {
    caseId,
    number: row.number,
    state: row.state,
    client: client?.name ?? "",
    answers: draft.answers,
    revision: draft.revision,
    savedAt: draft.savedAt.toISOString(),
    mayEdit: decide(actor, "case.editDraft", subject).allowed,
    mayAnswer: decide(actor, "case.answer", subject).allowed,
    mayAddFiles: addFiles.allowed ? null : addFiles.says,
    questions,
    files,
    earlier,
  };
}
