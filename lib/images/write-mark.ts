import "server-only";
import type { Transaction } from "@/db/client";
import { marks } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { canonicalJson } from "@/lib/canonical-json";
import { AppError } from "@/lib/errors";
import type { CitableValues } from "@/lib/records/constants";
import {
  addVersion,
  createRecord,
  nextLabel,
  type VersionContent,
} from "@/lib/records/write-version";
import type { WrittenVersion } from "@/lib/records/write-version";
import { checkGeometry } from "./check-geometry";
import { MARK_LETTER } from "./constants";
import type { Geometry, MarkContent } from "./mark-schemas";
import { headlineOf, markTitle } from "./mark-names";
import { measureMark, MEASURING_METHOD } from "./measure-mark";
import { groundFor, outlineOf } from "./measuring-ground";
import type { OpenImage } from "./open-image";
import { type PictureMarks, readPictureMarks } from "./picture-marks";

/** What a person says of a mark; the server adds the values. */
export type Description = Omit<MarkContent, "tool" | "measurements">;

/** @throws AppError INVALID when the mark does not fit this picture */
export function checkMark(
  image: OpenImage,
  state: PictureMarks,
  { geometry, originId }: Description,
  ownId: string | null,
): void {
  checkGeometry(geometry, image);
  const outline = outlineOf(state);
  if (geometry.tool === "area" && geometry.isOutline && outline && outline.id !== ownId) {
    throw new AppError(
      "INVALID",
      `${outline.label} is the section outline already. The mark was not saved. Delete ${outline.label} first, or save this one as a plain area.`,
    );
  }
  const known = state.marks.some(
    (mark) => mark.id === originId && !mark.isVoid && mark.content.tool === "origin",
  );
  if (originId !== null && !known) {
    throw new AppError(
      "INVALID",
      "The origin named for this front is not on the picture any more.",
    );
  }
}

function versionOf(
  state: PictureMarks,
  description: Description,
  reason: string | null,
): VersionContent & { content: MarkContent; inputs: string[] } {
  const { ground, inputs } = groundFor(state, description);
  const measurements = measureMark(description.geometry, ground);
  const content: MarkContent = {
    tool: description.geometry.tool,
    ...description,
    measurements,
  };
  const quotes: CitableValues = {};
  for (const { key, label, text, value, unit, expandedUncertainty, refused } of measurements) {
    if (refused !== null) continue;
    quotes[key] = {
      label: `${markTitle(content)}, ${label.toLowerCase()}`,
      text,
      value,
      unit: unit || null,
      expandedUncertainty,
      source: "measured",
    };
  }
  const headline = headlineOf(measurements);
  return {
    content,
    quotes,
    headline:
      headline?.value == null
        ? null
        : {
            value: headline.value,
            unit: headline.unit,
            expandedUncertainty: headline.expandedUncertainty,
          },
    method: MEASURING_METHOD,
    reason,
    inputs,
  };
}

async function keepShape(
  tx: Transaction,
  imageId: string,
  written: WrittenVersion,
  { geometry, featureCode }: { geometry: Geometry; featureCode: string | null },
): Promise<void> {
  await tx.insert(marks).values({
    versionId: written.versionId,
    recordId: written.recordId,
    imageId,
    tool: geometry.tool,
    featureCode,
    geometry,
  });
}

/** Makes a mark with its first version; the caller holds the case. */
export async function createMark(
  tx: Transaction,
  actor: Actor,
  image: OpenImage,
  description: Description,
): Promise<WrittenVersion> {
  const state = await readPictureMarks(tx, image.id);
  checkMark(image, state, description, null);
  const label = await nextLabel(tx, image.id, MARK_LETTER[description.geometry.tool]);
  const made = { caseId: image.caseId, kind: "mark", scopeId: image.id, label } as const;
  const written = await createRecord(tx, actor, made, versionOf(state, description, null));
  await keepShape(tx, image.id, written, description);
  return written;
}

/** Adds a version that a person made. @throws AppError CONFLICT with both contents */
export async function reviseMark(
  tx: Transaction,
  actor: Actor,
  image: OpenImage,
  markId: string,
  seenVersion: number,
  description: Description,
): Promise<WrittenVersion> {
  const state = await readPictureMarks(tx, image.id);
  checkMark(image, state, description, markId);
  const version = versionOf(state, description, null);
  const written = await addVersion(tx, actor, markId, seenVersion, version);
  await keepShape(tx, image.id, written, description);
  return written;
}

/**
 * Gives every live mark whose scale, outline or origin changed a new version with the values that
 * follow, and returns how many. Outlines go first, then origins, since others rest on them.
 */
export async function remeasure(
  tx: Transaction,
  actor: Actor,
  imageId: string,
  reason: string,
): Promise<number> {
  let changed = 0;
  for (const round of ["outline", "origin", "rest"] as const) {
    const state = await readPictureMarks(tx, imageId);
    for (const mark of state.marks) {
      const { geometry } = mark.content;
      const isOutline = geometry.tool === "area" && geometry.isOutline === true;
      const itsRound = isOutline ? "outline" : geometry.tool === "origin" ? "origin" : "rest";
      if (mark.isVoid || itsRound !== round) continue;
      const { measurements: before, tool: _tool, ...description } = mark.content;
      const version = versionOf(state, description, reason);
      const same =
        canonicalJson(version.inputs) === canonicalJson(mark.inputs) &&
        canonicalJson(version.content.measurements) === canonicalJson(before);
      if (same) continue;
      const written = await addVersion(tx, actor, mark.id, null, version);
      await keepShape(tx, imageId, written, description);
      changed += 1;
    }
  }
  return changed;
}
