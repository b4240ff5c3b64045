import "server-only";
import { and, eq } from "drizzle-orm";
import sharp from "sharp";
import { database, type Reader } from "@/db/client";
import { images, records, recordVersions, storedObjects } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { AppError, notFound } from "@/lib/errors";
import { formatCount } from "@/lib/format/numbers";
import { figureOverlay } from "./figure-overlay";
import { smallPicture } from "./figure-picture";
import { pictureTitle } from "./picture-facts";
import { headlineOf, markTitle } from "./mark-names";
import { caseOfImage } from "./open-image";
import { readPictureMarks, type StoredMark } from "./picture-marks";

export type Figure = {
  bytes: Buffer;
  mediaType: "image/jpeg";
  widthPx: number;
  heightPx: number;
  /** What the figure shows, for those who hear it. */
  alt: string;
};
export type FigureOptions = {
  /** Longer side of the figure. */
  maxPx?: number;
  withMarks?: boolean;
};

/** 164 mm wide in print at 250 dots to the inch. */
const USUAL_MAX_PX = 1600;
const JPEG_QUALITY = 90;

/**
 * A picture as it is shown in a report: from the original, with its marks and a scale bar drawn in.
 * The same picture and marks give the same bytes. The caller has asked the policy.
 * @throws AppError NOT_FOUND, or LOCKED while the picture is not ready
 */
export async function renderFigure(
  reader: Reader,
  imageId: string,
  { maxPx = USUAL_MAX_PX, withMarks = true }: FigureOptions = {},
): Promise<Figure> {
  const [row] = await reader
    .select({
      state: images.state,
      widthPx: images.widthPx,
      key: storedObjects.key,
      label: records.label,
      content: recordVersions.content,
    })
    .from(images)
    .innerJoin(storedObjects, eq(storedObjects.id, images.objectId))
    .innerJoin(records, eq(records.id, images.recordId))
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(eq(images.recordId, imageId));
  if (!row) throw notFound();
  if (row.state !== "ready" || row.widthPx === null) {
    throw new AppError("LOCKED", `${row.label} is not ready, so no figure can be made of it yet.`);
  }
  const { scale, marks } = await readPictureMarks(reader, imageId);
  const shown = withMarks ? marks.filter((mark) => !mark.isVoid) : [];
  const picture = await smallPicture(row.key, maxPx);
  const { widthPx, heightPx, channels } = picture;
  const umPerPx = scale?.content.umPerPx ?? null;
  const overlay = figureOverlay(shown, umPerPx, {
    widthPx,
    heightPx,
    scale: widthPx / row.widthPx,
  });
  const bytes = await sharp(picture.raw, { raw: { width: widthPx, height: heightPx, channels } })
    .toColourspace("srgb")
    .composite([{ input: Buffer.from(overlay) }])
    .jpeg({ quality: JPEG_QUALITY, chromaSubsampling: "4:4:4" })
    .toBuffer();
  return {
    bytes,
    mediaType: "image/jpeg",
    widthPx,
    heightPx,
    alt: altOf(row.label, pictureTitle(row.content), shown, umPerPx !== null),
  };
}

/** A figure for somebody who may see the work on the case. */
export async function getFigure(
  actor: Actor,
  imageId: string,
  options?: FigureOptions,
): Promise<Figure> {
  const caseId = await caseOfImage(database(), imageId);
  await getCase(actor, "case.viewWork", caseId);
  return renderFigure(database(), imageId, options);
}

function altOf(
  label: string,
  title: string,
  marks: readonly StoredMark[],
  hasBar: boolean,
): string {
  const said = marks.map((mark) => {
    const headline = headlineOf(mark.content.measurements);
    const value = headline && headline.refused === null ? ` ${headline.text}` : "";
    return `${mark.label} ${markTitle(mark.content)}${value}`;
  });
  return [
    title ? `${label}, ${title}.` : `${label}.`,
    said.length > 0 ? `${formatCount(said.length, "mark")}: ${said.join("; ")}.` : "No marks.",
    hasBar ? "With a scale bar." : "Not calibrated, so there is no scale bar.",
  ].join(" ");
}
