import "server-only";
import { aliasedTable, and, asc, eq, ne, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { images, people, records, recordVersions, storedObjects } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { decide } from "@/lib/auth/policy";
import { getCase } from "@/lib/cases/get-case";
import { calibrationContent } from "./calibration-schemas";
import type { ImageState } from "./constants";
import { findDuplicates, type SamePicture } from "./find-duplicates";
import { type ImageContent, imageContent } from "./image-schemas";
import { pixelSizeText } from "./pixel-size-text";

export type PictureRow = {
  id: string;
  label: string;
  version: number;
  state: ImageState;
  /** Why it was withdrawn; null while it stands. */
  withdrawnBecause: string | null;
  content: ImageContent;
  /** "E1.1" of the item it shows; null when none is named. */
  itemLabel: string | null;
  isShareable: boolean;
  widthPx: number | null;
  heightPx: number | null;
  bitDepth: number | null;
  fileName: string;
  sizeBytes: number;
  by: string;
  at: string;
  /** Size of a pixel with its uncertainty; null while not calibrated. */
  pixelText: string | null;
  markCount: number;
  /** What the file said that a person should know. */
  fileNotes: string[];
  duplicates: SamePicture[];
};
export type PictureList = {
  pictures: PictureRow[];
  items: { id: string; label: string }[];
  /** Why none can be added now; null when they can. */
  mayNotAdd: string | null;
  mayDescribe: boolean;
};

const newest = and(
  eq(recordVersions.recordId, records.id),
  eq(recordVersions.number, records.latestVersion),
);

async function scalesOf(caseId: string): Promise<Map<string, string>> {
  const rows = await database()
    .select({ imageId: records.scopeId, content: recordVersions.content })
    .from(records)
    .innerJoin(recordVersions, newest)
    .where(
      and(eq(records.caseId, caseId), eq(records.kind, "calibration"), ne(records.state, "void")),
    );
  return new Map(
    rows.map(({ imageId, content }) => [
      imageId,
      pixelSizeText(calibrationContent.parse(content)).text,
    ]),
  );
}

async function markCountsOf(caseId: string): Promise<Map<string, number>> {
  const rows = await database()
    .select({ imageId: records.scopeId, count: sql<number>`count(*)`.mapWith(Number) })
    .from(records)
    .where(and(eq(records.caseId, caseId), eq(records.kind, "mark"), ne(records.state, "void")))
    .groupBy(records.scopeId);
  return new Map(rows.map(({ imageId, count }) => [imageId, count]));
}

function fileNotesOf(metadata: Record<string, unknown> | null): string[] {
  const notes: string[] = [];
  const { page, pages, shownWindow } = metadata ?? {};
  if (typeof pages === "number" && pages > 1) {
    notes.push(`The file has ${pages} pages. Page ${String(page)}, the largest, is shown.`);
  }
  if (shownWindow) notes.push("16 bit, shown in 8 bit. The original keeps its values.");
  return notes;
}

/** The pictures of a case, withdrawn ones included, in the order they came in. */
export async function listPictures(actor: Actor, caseId: string): Promise<PictureList> {
  const { subject } = await getCase(actor, "case.viewWork", caseId);
  const item = aliasedTable(records, "item");
  const [rows, scales, markCounts, items] = await Promise.all([
    database()
      .select({
        id: records.id,
        label: records.label,
        version: records.latestVersion,
        recordState: records.state,
        voidReason: records.voidReason,
        content: recordVersions.content,
        image: images,
        fileName: storedObjects.fileName,
        sizeBytes: storedObjects.sizeBytes,
        by: people.name,
        at: records.madeAt,
      })
      .from(images)
      .innerJoin(records, eq(records.id, images.recordId))
      .innerJoin(recordVersions, newest)
      .innerJoin(storedObjects, eq(storedObjects.id, images.objectId))
      .innerJoin(people, eq(people.id, records.madeById))
      .where(eq(images.caseId, caseId))
      .orderBy(asc(records.madeAt), asc(records.id)),
    scalesOf(caseId),
    markCountsOf(caseId),
    database()
      .select({ id: item.id, label: item.label })
      .from(item)
      .where(and(eq(item.caseId, caseId), eq(item.kind, "item"), ne(item.state, "void")))
      .orderBy(asc(item.madeAt), asc(item.id)),
  ]);
  const duplicates = await findDuplicates(
    actor,
    rows.map((row) => row.id),
  );
  const itemLabels = new Map(items.map(({ id, label }) => [id, label]));
  const add = decide(actor, "image.add", subject);
  return {
    items,
    mayNotAdd: add.allowed ? null : add.says,
    mayDescribe: decide(actor, "image.describe", subject).allowed,
    pictures: rows.map(({ image, recordState, voidReason, content: raw, at, ...row }) => {
      const content = imageContent.parse(raw);
      return {
        ...row,
        at: at.toISOString(),
        state: image.state,
        withdrawnBecause: recordState === "void" ? (voidReason ?? "") : null,
        content,
        itemLabel: content.itemId === null ? null : (itemLabels.get(content.itemId) ?? null),
        isShareable: image.isShareable,
        widthPx: image.widthPx,
        heightPx: image.heightPx,
        bitDepth: image.bitDepth,
        pixelText: scales.get(row.id) ?? null,
        markCount: markCounts.get(row.id) ?? 0,
        fileNotes: fileNotesOf(image.metadata),
        duplicates: duplicates.get(row.id) ?? [],
      };
    }),
  };
}
