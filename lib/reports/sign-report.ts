import "server-only";
import { and, eq, isNull, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { people, reportIssues, signIns } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { verifyPassword } from "@/lib/auth/password";
import { requireAllowed } from "@/lib/auth/require";
import { endSignIn } from "@/lib/auth/sign-ins";
import { canonicalJson, sha256Hex } from "@/lib/canonical-json";
import { documentDigest, gateLedger } from "@/lib/cases/gates";
import { getCase } from "@/lib/cases/get-case";
import { moveCase } from "@/lib/cases/move-case";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { findIssue } from "@/lib/findings/find-issue";
import { parseInput } from "@/lib/http/parse-input";
import { enqueue } from "@/lib/jobs/queue";
import { collectReport } from "./collect-report";
import { SignReportInput } from "./schemas";

const WRONG_PASSWORDS_MAX = 3;

/** Asks for the password again; three wrong ones in a row end the sign-in. */
async function confirmPassword(actor: Actor, signInId: string, password: string): Promise<void> {
  const [person] = await database()
    .select({ passwordHash: people.passwordHash })
    .from(people)
    .where(eq(people.id, actor.id));
  if (await verifyPassword(person?.passwordHash ?? null, password)) {
    await database()
      .update(signIns)
      .set({ failedConfirmations: 0 })
      .where(eq(signIns.id, signInId));
    return;
  }
  await database()
    .update(signIns)
    .set({ failedConfirmations: sql`${signIns.failedConfirmations} + 1` })
    .where(eq(signIns.id, signInId));
  const [row] = await database()
    .select({ n: signIns.failedConfirmations })
    .from(signIns)
    .where(eq(signIns.id, signInId));
  if ((row?.n ?? 0) >= WRONG_PASSWORDS_MAX) {
    await endSignIn(signInId);
    throw new AppError(
      "NOT_SIGNED_IN",
      "You are signed out. Nothing was signed. The draft is kept.",
    );
  }
  throw new AppError("INVALID", undefined, {
    fields: { password: "This is not your password. Nothing was signed." },
  });
}

/**
 * Signs the open issue: the text is the one that was on screen, all gates are met, and content,
 * values and the versions beneath are frozen with their digests. The report is then stored by a job.
 * @throws AppError CONFLICT when the text changed or someone signed first
 */
export async function signReport(
  actor: Actor,
  signInId: string,
  raw: unknown,
): Promise<{ issueNumber: number; fingerprint: string }> {
  const input = parseInput(SignReportInput, raw);
  const { subject } = await getCase(actor, "case.viewWork", input.caseId);
  requireAllowed(actor, "report.sign", subject);
  await confirmPassword(actor, signInId, input.password);
  return writeCase(actor, "report.sign", input.caseId, async (tx, { row }) => {
    const issue = await findIssue(tx, input.caseId, "lock");
    if (!issue) throw new AppError("LOCKED", "There is no open issue to sign.");
    if (documentDigest(issue.document) !== input.documentSha256) {
      throw new AppError(
        "CONFLICT",
        "The findings changed since you opened them. Nothing was signed. Read them again.",
      );
    }
    const open = (await gateLedger(tx, row.id)).filter((gate) => !gate.isMet);
    if (open.length > 0) {
      throw new AppError(
        "INVALID",
        `Nothing was signed. Still open: ${open.map((gate) => gate.title).join("; ")}.`,
      );
    }
    const at = new Date();
    const frozen = await collectReport(tx, row, issue, { id: actor.id, at });
    const manifestSha256 = sha256Hex(canonicalJson(frozen));
    const [result] = await tx
      .update(reportIssues)
      .set({
        state: "signed",
        frozen,
        manifest: frozen.manifest,
        manifestSha256,
        signedById: actor.id,
        signedAt: at,
      })
      .where(and(eq(reportIssues.id, issue.id), isNull(reportIssues.signedAt)));
    if (result.affectedRows !== 1)
      throw new AppError("CONFLICT", "Someone signed this issue already.");
    await moveCase(tx, actor, row, "sign", { signedAt: at }, null, {
      issue: issue.number,
      manifestSha256,
      revision: issue.revision,
    });
    await enqueue(tx, {
      kind: "report.store",
      payload: { issueId: issue.id },
      uniqueKey: `report.store:${issue.id}`,
    });
    return { issueNumber: issue.number, fingerprint: manifestSha256 };
  });
}
