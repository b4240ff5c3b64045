"use server";

import { revalidatePath } from "next/cache";
import { currentSignInId } from "@/lib/auth/session";
import { AppError } from "@/lib/errors";
import {
  RecordReadingInput,
  SendBackInput,
  SendForSignOffInput,
  SendToSecondReaderInput,
} from "@/lib/findings/move-schemas";
import { recordReading } from "@/lib/findings/record-reading";
import { sendBack } from "@/lib/findings/send-back";
import { sendForSignOff } from "@/lib/findings/send-for-sign-off";
import { sendToSecondReader } from "@/lib/findings/send-to-second-reader";
import { action } from "@/lib/http/action";
import { openNewIssue } from "@/lib/reports/open-new-issue";
import { OpenNewIssueInput, SignReportInput } from "@/lib/reports/schemas";
import { signReport } from "@/lib/reports/sign-report";
import { routes } from "@/lib/routes";

const refresh = (caseId: string) => revalidatePath(routes.case(caseId), "layout");

export const sendToReader = action(
  { permission: "findings.sendToSecondReader", input: SendToSecondReaderInput },
  async (actor, input) => {
    await sendToSecondReader(actor, input);
    refresh(input.caseId);
  },
);

export const saveReading = action(
  { permission: "findings.recordReading", input: RecordReadingInput },
  async (actor, input) => {
    const reading = await recordReading(actor, input);
    refresh(input.caseId);
    return reading;
  },
);

export const sendForSignature = action(
  { permission: "findings.sendForSignOff", input: SendForSignOffInput },
  async (actor, input) => {
    await sendForSignOff(actor, input);
    refresh(input.caseId);
  },
);

export const sendFindingsBack = action(
  { permission: "findings.sendBack", input: SendBackInput },
  async (actor, input) => {
    await sendBack(actor, input);
    refresh(input.caseId);
  },
);

export const sign = action(
  { permission: "report.sign", input: SignReportInput },
  async (actor, input) => {
    const signInId = await currentSignInId();
    if (!signInId) throw new AppError("NOT_SIGNED_IN");
    const signed = await signReport(actor, signInId, input);
    refresh(input.caseId);
    return signed;
  },
);

export const startNewIssue = action(
  { permission: "report.openNewIssue", input: OpenNewIssueInput },
  async (actor, input) => {
    const issue = await openNewIssue(actor, input);
    refresh(input.caseId);
    return issue;
  },
);
