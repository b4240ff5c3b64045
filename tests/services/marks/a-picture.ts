import { asc, eq } from "drizzle-orm";
import sharp from "sharp";
import { database } from "@/db/client";
import { auditEvents, recordVersions } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { getBenchState } from "@/lib/images/marks-queries";
import { addImageBytes } from "@/lib/uploads/add-bytes";
import { aCase } from "../../helpers/cases";
import { asTechnician } from "../../helpers/people";

export const SIZE = { widthPx: 2000, heightPx: 1500 };

/** A picture that is ready to be marked, without a scale. */
export async function aPicture(caseId?: string): Promise<{ caseId: string; imageId: string }> {
  const home = caseId ?? (await aCase());
  const bytes = await sharp({
    create: { width: SIZE.widthPx, height: SIZE.heightPx, channels: 3, background: "#777" },
  })
    .png()
    .toBuffer();
  const { imageId } = await addImageBytes(await asTechnician(), {
    caseId: home,
    fileName: "face.png",
    mediaType: "image/png",
    bytes,
    details: { technique: "stereo" },
  });
  return { caseId: home, imageId };
}

/** 10 mm over 1000 px: 10 µm a pixel, with 1.2 % from a distance known to 0.12 mm (k = 2). */
export const aScale = (
  imageId: string,
  seenVersion: number | null = null,
  knownDistanceMm = 10,
) => ({
  imageId,
  seenVersion,
  source: "two_points" as const,
  standard: "Scale bar",
  points: [
    [100, 1400],
    [1100, 1400],
  ],
  knownDistanceMm,
  knownDistanceUncertaintyMm: 0.12,
});

export const LENGTH = {
  tool: "length" as const,
  points: [
    [100, 100],
    [1100, 100],
  ],
};
export const SQUARE = {
  tool: "area" as const,
  points: [
    [200, 200],
    [700, 200],
    [700, 700],
    [200, 700],
  ],
};

/** The marks of a picture by label, as the bench shows them. */
export async function marksOf(actor: Actor, imageId: string) {
  const { marks, deleted, scale } = await getBenchState(actor, imageId);
  return { marks, deleted, scale, labels: marks.map(({ label }) => label) };
}

export async function theMark(actor: Actor, imageId: string, label: string) {
  const { marks, deleted } = await marksOf(actor, imageId);
  const found = [...marks, ...deleted].find((mark) => mark.label === label);
  if (!found) throw new Error(`there is no ${label}`);
  return found;
}

/** One value of a mark as it is printed, or why there is none. */
export async function valueOf(actor: Actor, imageId: string, label: string, key: string) {
  const { content } = await theMark(actor, imageId, label);
  const value = content.measurements.find((one) => one.key === key);
  return value && (value.refused ?? value.text.replaceAll("\u00a0", " "));
}

export const versionsOf = (recordId: string) =>
  database()
    .select()
    .from(recordVersions)
    .where(eq(recordVersions.recordId, recordId))
    .orderBy(asc(recordVersions.number));

export const eventsOf = (caseId: string) =>
  database()
    .select()
    .from(auditEvents)
    .where(eq(auditEvents.chain, caseId))
    .orderBy(asc(auditEvents.position));
