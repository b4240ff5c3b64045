import { z } from "zod";
import { imageContent } from "@/lib/images/image-schemas";
import { UPLOAD_PURPOSES, type UploadPurpose, type UploadState } from "./constants";

const sha256 = z.string().regex(/^[0-9a-f]{64}$/, "This is not a SHA-256.");
const uploadPart = z.number().int().min(1).max(10_000);

/** What becomes of the file: the description of a picture, or the caption of a paper. */
export const uploadDetails = imageContent
  .pick({
    caption: true,
    technique: true,
    itemId: true,
    face: true,
    magnification: true,
    takenOn: true,
  })
  .partial()
  .extend({ isShareable: z.boolean().optional() });
export type UploadDetails = z.infer<typeof uploadDetails>;

export const StartUploadInput = z.object({
  caseId: z.string().max(40),
  purpose: z.enum(UPLOAD_PURPOSES),
  fileName: z
    .string()
    .trim()
    .min(1, "The file has no name.")
    .max(255, "The file's name is longer than 255 characters. Shorten it and send it again.")
    .refine((name) => !/[\u0000-\u001f\u007f/\\]/.test(name), {
      error: "The file's name holds a character that no file name may hold. Rename it.",
    }),
  sizeBytes: z.number().int().min(1, "The file is empty. Nothing was sent. Choose another file."),
  mediaType: z.string().max(100),
  /** Milliseconds since 1970, as the browser tells it. */
  lastModified: z.number().int().min(0).max(Number.MAX_SAFE_INTEGER),
  /** SHA-256 of the first part, so that a file that goes on is the same file. */
  firstPartSha256: sha256,
  details: uploadDetails.default({}),
});

export const ReportPartsInput = z.object({
  /** Parts that the store has taken, with the ETag it gave. */
  done: z
    .array(
      z.object({
        partNumber: uploadPart,
        etag: z.string().min(1).max(100),
        sizeBytes: z.number().int().min(1),
      }),
    )
    .max(100)
    .default([]),
  /** Parts to be sent next. */
  want: z.array(uploadPart).max(100).default([]),
});

export const FinishUploadInput = z.object({ sha256 });

export const UnfinishedQuery = z.object({
  caseId: z.string().max(40),
  purpose: z.enum(UPLOAD_PURPOSES),
});

export type PartAddress = { partNumber: number; url: string };

/** How to send a file: in one piece to `url`, or in parts. */
export type UploadTicket = {
  uploadId: string;
  way:
    | { kind: "whole"; url: string; mediaType: string }
    | { kind: "parts"; partSizeBytes: number; parts: PartAddress[]; alreadySent: number[] };
};

/** Where a file stands on its way in. */
export type UploadStatus = {
  uploadId: string;
  caseId: string;
  purpose: UploadPurpose;
  state: UploadState;
  fileName: string;
  sizeBytes: number;
  /** Bytes that the store has already, of a file sent in parts. */
  sentBytes: number;
  startedAt: string;
  /** Why it was refused, what was kept and what to do; null otherwise. */
  refusal: string | null;
  /** The picture made of it, once there. */
  imageId: string | null;
  imageLabel: string | null;
};
