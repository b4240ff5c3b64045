import "server-only";
import { and, asc, eq, ne } from "drizzle-orm";
import { database } from "@/db/client";
import { images, records, recordVersions } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { type Action, type CaseSubject, decide } from "@/lib/auth/policy";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";
import type { BenchMark, BenchPicture, BenchScale, BenchState, FilmPicture } from "./bench-state";
import { markLabel } from "./mark-label";
import { MARK_TOOLS } from "./constants";
import { caseOfImage } from "./open-image";
import { pictureFacts } from "./picture-facts";
import { readPictureMarks, type StoredMark, type StoredScale } from "./picture-marks";
import { pixelSizeText } from "./pixel-size-text";

const newest = and(
  eq(recordVersions.recordId, records.id),
  eq(recordVersions.number, records.latestVersion),
);

function benchMark(mark: StoredMark): BenchMark {
  const { id, label, versionId, number, content, by, at } = mark;
  const caption = markLabel(label, content);
  return { id, label, versionId, number, content, caption, by, at: at.toISOString() };
}

function benchScale({ id, label, number, content, by, at }: StoredScale): BenchScale {
  const pixelText = pixelSizeText(content).text;
  return { id, label, number, content, pixelText, by, at: at.toISOString() };
}

function refusalOf(actor: Actor, action: Action, subject: CaseSubject): string | null {
  const decision = decide(actor, action, subject);
  return decision.allowed ? null : decision.says;
}

/**
 * What is on a picture now, for somebody who may see the work.
 * @throws AppError NOT_FOUND
 */
export async function getBenchState(actor: Actor, imageId: string): Promise<BenchState> {
  const reader = database();
  const caseId = await caseOfImage(reader, imageId);
  const { subject } = await getCase(actor, "case.viewWork", caseId);
  const [image] = await reader
    .select({ image: images, recordState: records.state, voidReason: records.voidReason })
    .from(images)
    .innerJoin(records, eq(records.id, images.recordId))
    .where(eq(images.recordId, imageId));
  if (!image) throw notFound();
  const { scale, marks: unsorted } = await readPictureMarks(reader, imageId);
  // Kinds together, from the origin outward; within a kind in the order they were made.
  const kind = (mark: StoredMark) => MARK_TOOLS.indexOf(mark.content.tool);
  const marks = unsorted.toSorted((a, b) => kind(a) - kind(b));
  const withdrawn =
    image.recordState === "void"
      ? `This picture was withdrawn${image.voidReason ? `: ${image.voidReason}` : ""}.`
      : null;
  return {
    state: image.image.state,
    refusal: image.image.refusal,
    widthPx: image.image.widthPx,
    heightPx: image.image.heightPx,
    scale: scale && benchScale(scale),
    marks: marks.filter((mark) => !mark.isVoid).map(benchMark),
    deleted: marks.filter((mark) => mark.isVoid).map(benchMark),
    mayNotMark: withdrawn ?? refusalOf(actor, "image.mark", subject),
    mayNotCalibrate: withdrawn ?? refusalOf(actor, "image.calibrate", subject),
  };
}

/** A picture with what stands about it and on it. @throws AppError NOT_FOUND, also for another case */
export async function getBench(
  actor: Actor,
  caseId: string,
  imageId: string,
): Promise<{ picture: BenchPicture; state: BenchState }> {
  const { row } = await getCase(actor, "case.viewWork", caseId);
  const [found] = await database()
    .select({ image: images, label: records.label, content: recordVersions.content })
    .from(images)
    .innerJoin(records, eq(records.id, images.recordId))
    .innerJoin(recordVersions, newest)
    .where(and(eq(images.recordId, imageId), eq(images.caseId, caseId)));
  if (!found) throw notFound();
  const { image } = found;
  const { title, facts } = await pictureFacts(database(), found.content);
  return {
    picture: {
      id: imageId,
      caseId,
      caseNumber: row.number,
      label: found.label,
      title,
      facts,
      fileUmPerPx:
        image.fileUmPerPxX && image.fileUmPerPxY
          ? { x: image.fileUmPerPxX, y: image.fileUmPerPxY }
          : null,
    },
    state: await getBenchState(actor, imageId),
  };
}

/** The pictures of a case in the order they came in, for the strip under the bench. */
export async function listFilm(actor: Actor, caseId: string): Promise<FilmPicture[]> {
  await getCase(actor, "case.viewWork", caseId);
  const rows = await database()
    .select({
      id: images.recordId,
      label: records.label,
      state: images.state,
      content: recordVersions.content,
    })
    .from(images)
    .innerJoin(records, eq(records.id, images.recordId))
    .innerJoin(recordVersions, newest)
    .where(and(eq(images.caseId, caseId), ne(records.state, "void")))
    .orderBy(asc(records.madeAt), asc(records.id));
  return Promise.all(
    rows.map(async ({ id, label, state, content }) => {
      const { title, magnification } = await pictureFacts(database(), content);
      return { id, label, title, magnification, state };
    }),
  );
}
