import { IMAGE_MAX_BYTES, IMAGE_MEDIA_TYPES } from "@/lib/images/constants";
import { REQUEST_FILE_MAX_BYTES, REQUEST_FILE_MEDIA_TYPES, type UploadPurpose } from "./constants";

export type FileMediaType = (typeof REQUEST_FILE_MEDIA_TYPES)[number];

const ENDINGS: Record<FileMediaType, readonly string[]> = {
  "image/jpeg": [".jpg", ".jpeg"],
  "image/png": [".png"],
  "image/tiff": [".tif", ".tiff"],
  "application/pdf": [".pdf"],
};

export const FILE_TYPE_NAMES: Record<FileMediaType, string> = {
  "image/jpeg": "JPEG",
  "image/png": "PNG",
  "image/tiff": "TIFF",
  "application/pdf": "PDF",
};

export type FileRule = {
  mediaTypes: readonly FileMediaType[];
  maxBytes: number;
  /** "JPEG, PNG or TIFF picture" */
  says: string;
};

export const FILE_RULES: Record<UploadPurpose, FileRule> = {
  image: {
    mediaTypes: IMAGE_MEDIA_TYPES,
    maxBytes: IMAGE_MAX_BYTES,
    says: "JPEG, PNG or TIFF picture",
  },
  request_file: {
    mediaTypes: REQUEST_FILE_MEDIA_TYPES,
    maxBytes: REQUEST_FILE_MAX_BYTES,
    says: "JPEG, PNG or TIFF picture or PDF",
  },
};

/** Media type that a file's name promises, or null. */
export function promisedType(fileName: string): FileMediaType | null {
  const name = fileName.toLowerCase();
  return (
    REQUEST_FILE_MEDIA_TYPES.find((type) => ENDINGS[type].some((end) => name.endsWith(end))) ?? null
  );
}

/** Accept map of a file field: media types with their endings. */
export function acceptMap(purpose: UploadPurpose): Record<string, string[]> {
  return Object.fromEntries(
    FILE_RULES[purpose].mediaTypes.map((type) => [type, [...ENDINGS[type]]]),
  );
}

const megabytes = (bytes: number) => Math.floor(bytes / 1024 / 1024);

/** Why a file cannot be sent at all, or null. Its content is looked at once it is here. */
export function refusalBeforeSending(
  purpose: UploadPurpose,
  file: { name: string; size: number },
): { code: "INVALID" | "TOO_LARGE"; says: string } | null {
  const rule = FILE_RULES[purpose];
  const type = promisedType(file.name);
  if (type === null || !rule.mediaTypes.includes(type)) {
    return {
      code: "INVALID",
      says: `${file.name} is not named like a ${rule.says}. Nothing was sent. Save it as one of these and choose it again.`,
    };
  }
  if (file.size === 0) {
    return {
      code: "INVALID",
      says: `${file.name} is empty (0 bytes). Nothing was sent. Export it again at its source.`,
    };
  }
  if (file.size > rule.maxBytes) {
    return {
      code: "TOO_LARGE",
      says: `${file.name} has ${megabytes(file.size)} MB. At most ${megabytes(rule.maxBytes)} MB are taken. Nothing was sent. Crop it or save it compressed.`,
    };
  }
  return null;
}
