import "server-only";
import { eq } from "drizzle-orm";
import { uploads } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { recordEvent } from "@/lib/audit/record";
import { findUpload } from "./find-upload";

/**
 * Notes why a file was not taken in, for the person who sent it.
 * @returns false when it was decided before, so that nothing was noted
 */
export async function refuseUpload(uploadId: string, refusal: string): Promise<boolean> {
  return transaction(async (tx) => {
    const upload = await findUpload(tx, uploadId, "lock");
    if (upload?.state !== "sent") return false;
    await tx
      .update(uploads)
      .set({ state: "refused", refusal, changedAt: new Date() })
      .where(eq(uploads.id, uploadId));
    await recordEvent(tx, {
      caseId: upload.caseId,
      actor: null,
      action: "system.takeInImage",
      subject: { kind: "upload", id: uploadId, label: upload.fileName },
      before: { state: "sent" },
      after: { state: "refused", refusal },
    });
    return true;
  });
}
