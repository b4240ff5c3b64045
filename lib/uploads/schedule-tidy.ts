import "server-only";
import { transaction } from "@/db/transaction";
import { enqueue } from "@/lib/jobs/queue";

/** Asks for the tidying of a day, once however many workers ask. */
export async function scheduleTidy(runAt: Date): Promise<void> {
  const day = runAt.toISOString().slice(0, 10);
  await transaction((tx) =>
    enqueue(tx, { kind: "upload.tidy", payload: {}, uniqueKey: `upload-tidy-${day}`, runAt }),
  );
}
