import { spawn } from "node:child_process";
import { once } from "node:events";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { eq } from "drizzle-orm";
import sharp from "sharp";
import { afterAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, images, storedObjects } from "@/db/schema";
import { takeInImageJob } from "@/lib/images/take-in-image-job";
import { objectStore } from "@/lib/storage/s3";
import { originalKey } from "@/lib/uploads/fetch-original";
import { aCase } from "../../helpers/cases";
import { asInvestigator } from "../../helpers/people";
import { sendFile, uploadRow } from "../../helpers/send-file";

const PROGRAM = `
import { takeInImageJob } from "@/lib/images/take-in-image-job";
process.send("begun");
await takeInImageJob.run({ uploadId: process.argv[2] });
process.exit(0);
`;

/** Where the killed processes leave their work. */
const folder = mkdtempSync(path.join(tmpdir(), "riverline-killed-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** Runs the job in a process of its own and kills it after `afterMs`; true when it was cut short. */
async function runAndKill(uploadId: string, afterMs: number): Promise<boolean> {
  const child = spawn(
    process.execPath,
    [
      "--conditions=react-server",
      "--import",
      "tsx",
      "--input-type=module",
      "--eval",
      PROGRAM,
      "--",
      "worker",
      uploadId,
    ],
    { stdio: ["ignore", "ignore", "inherit", "ipc"], env: { ...process.env, TMPDIR: folder } },
  );
  const gone = once(child, "exit");
  await Promise.race([once(child, "message"), gone]);
  await Promise.race([new Promise((resolve) => setTimeout(resolve, afterMs)), gone]);
  child.kill("SIGKILL");
  const [code] = (await gone) as [number | null];
  return code === null;
}

describe("a worker that is killed", () => {
  it("at any moment leaves a file that another takes in whole, once", async () => {
    const actor = await asInvestigator();
    const [width, height] = [3500, 2500];
    const raw = Buffer.alloc(width * height * 3);
    for (let i = 0; i < raw.byteLength; i += 1) raw[i] = (i * 13) % 241;
    const bytes = await sharp(raw, { raw: { width, height, channels: 3 } })
      .tiff({ compression: "none" })
      .toBuffer();
    const caseId = await aCase();
    const uploadId = await sendFile(actor, { caseId, fileName: "face.tif", bytes });
    let cutShort = 0;
    for (const afterMs of [5, 120, 400, 800]) {
      if (await runAndKill(uploadId, afterMs)) cutShort += 1;
    }
    expect(cutShort).toBeGreaterThanOrEqual(2);
    await takeInImageJob.run({ uploadId });
    expect(await uploadRow(uploadId)).toMatchObject({ state: "taken", refusal: null });
    const [image, ...more] = await database()
      .select()
      .from(images)
      .where(eq(images.caseId, caseId));
    expect(more).toEqual([]);
    expect(image).toMatchObject({ state: "ready", widthPx: width, heightPx: height });
    expect(
      await database().select().from(storedObjects).where(eq(storedObjects.caseId, caseId)),
    ).toHaveLength(1);
    expect((await objectStore().getBytes(originalKey(uploadId))).equals(bytes)).toBe(true);
    expect(await objectStore().head((await uploadRow(uploadId)).key)).toBeNull();
    for (const tile of ["3072,2048,428,452/428,452/0/default.jpg", "thumbnail.jpg"]) {
      expect(await objectStore().head(`${image?.tilePrefix}/${tile}`)).not.toBeNull();
    }
    const told = await database().select().from(auditEvents).where(eq(auditEvents.chain, caseId));
    expect(told.filter((event) => event.action === "system.takeInImage")).toHaveLength(1);
  }, 120_000);
});
