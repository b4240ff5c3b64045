import "server-only";
import type { Transaction } from "@/db/client";
import { database } from "@/db/client";
import { calibrations } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { pixelSizeFromFile, pixelSizeFromTwoPoints } from "@/lib/imaging/calibration";
import { LABEL_PREFIX } from "@/lib/records/constants";
import {
  addVersion,
  createRecord,
  nextLabel,
  type VersionContent,
  type WrittenVersion,
} from "@/lib/records/write-version";
import { type CalibrationContent, CalibrateImageInput } from "./calibration-schemas";
import { caseOfImage, type OpenImage, openImage } from "./open-image";
import { readPictureMarks, type StoredScale } from "./picture-marks";
import { pixelSizeText } from "./pixel-size-text";
import { remeasure } from "./write-mark";

const METHOD = { name: "Scale of a picture", version: "1" } as const;

/**
 * Sets the scale of a picture, or changes it: every measured mark then gets a new version with the
 * values that follow, in the same transaction.
 * @throws AppError CONFLICT when there is another scale than the one seen; INVALID, LOCKED, NOT_FOUND
 */
export async function calibrateImage(
  actor: Actor,
  input: unknown,
): Promise<WrittenVersion & { recomputed: number }> {
  const { imageId, seenVersion, ...settings } = parseInput(CalibrateImageInput, input);
  const caseId = await caseOfImage(database(), imageId);
  return writeCase(actor, "image.calibrate", caseId, async (tx) => {
    const image = await openImage(tx, imageId);
    const content = contentOf(image, settings);
    const { scale } = await readPictureMarks(tx, imageId);
    const written = scale
      ? await addVersion(tx, actor, scale.id, seenVersion ?? 0, versionOf(content))
      : await firstScale(tx, actor, image, content);
    await tx.insert(calibrations).values({
      versionId: written.versionId,
      recordId: written.recordId,
      imageId,
      source: settings.source,
      umPerPx: content.umPerPx,
      relativeUncertainty: content.relativeUncertainty,
    });
    const recomputed = await remeasure(tx, actor, imageId, reasonFor(written, scale));
    await recordEvent(tx, {
      caseId,
      actor,
      action: "image.calibrate",
      subject: {
        kind: "calibration",
        id: written.recordId,
        label: `${image.label} ${written.label}`,
      },
      before: scale?.content ?? null,
      after: { ...content, recomputed },
    });
    return { ...written, recomputed };
  });
}

const reasonFor = (written: WrittenVersion, before: StoredScale | null) =>
  `Recomputed: scale ${written.label} was ${before ? "changed" : "set"}`;

async function firstScale(
  tx: Transaction,
  actor: Actor,
  image: OpenImage,
  content: CalibrationContent,
): Promise<WrittenVersion> {
  const label = await nextLabel(tx, image.id, LABEL_PREFIX.calibration);
  const made = { caseId: image.caseId, kind: "calibration", scopeId: image.id, label } as const;
  return createRecord(tx, actor, made, versionOf(content));
}

function contentOf(image: OpenImage, settings: CalibrationContent["settings"]): CalibrationContent {
  if (settings.source === "two_points") {
    const outside = settings.points.some(([x, y]) => x > image.widthPx || y > image.heightPx);
    if (outside) {
      throw new AppError(
        "INVALID",
        "A point of the scale lies outside the picture. The scale is as it was. Pick both points on the picture.",
      );
    }
  }
  const size =
    settings.source === "two_points"
      ? pixelSizeFromTwoPoints(settings)
      : pixelSizeFromFile(
          { umPerPxX: image.fileUmPerPxX, umPerPxY: image.fileUmPerPxY },
          settings.relativeUncertaintyPercent / 100,
        );
  if ("verdict" in size) throw new AppError("INVALID", size.reason);
  return { settings, ...size };
}

function versionOf(content: CalibrationContent): VersionContent {
  const size = pixelSizeText(content);
  return {
    content,
    quotes: { pixelSize: { label: "Pixel size", ...size, source: "measured" } },
    headline: size,
    method: METHOD,
  };
}
