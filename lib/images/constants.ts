/** How a picture was taken; magnification alone says nothing about scale. */
export const TECHNIQUES = [
  "camera",
  "stereo",
  "light_microscope",
  "sem_se",
  "sem_bse",
  "other",
] as const;
export type Technique = (typeof TECHNIQUES)[number];
export const TECHNIQUE_NAMES: Record<Technique, string> = {
  camera: "Camera",
  stereo: "Stereo microscope",
  light_microscope: "Light microscope",
  sem_se: "Scanning electron microscope, secondary electrons",
  sem_bse: "Scanning electron microscope, backscattered electrons",
  other: "Other",
};

/** Where a picture stands between arriving and being ready to mark. */
export const IMAGE_STATES = ["checking", "tiling", "ready", "refused"] as const;
export type ImageState = (typeof IMAGE_STATES)[number];

/** Drawing tools of the bench; the letter starts the label of the mark. */
export const MARK_TOOLS = [
  "origin",
  "ratchet",
  "front",
  "area",
  "length",
  "angle",
  "count",
  "note",
] as const;
export type MarkTool = (typeof MARK_TOOLS)[number];
export const MARK_LETTER: Record<MarkTool, string> = {
  origin: "O",
  ratchet: "R",
  front: "B",
  area: "A",
  length: "D",
  angle: "G",
  count: "C",
  note: "N",
};

export const CALIBRATION_SOURCES = ["two_points", "file_resolution"] as const;
export type CalibrationSource = (typeof CALIBRATION_SOURCES)[number];
export const CALIBRATION_SOURCE_NAMES: Record<CalibrationSource, string> = {
  two_points: "Two points of known distance",
  file_resolution: "The file's own resolution",
};

export const CONFIDENCES = ["sure", "likely", "possible"] as const;
export type Confidence = (typeof CONFIDENCES)[number];

export const IMAGE_MEDIA_TYPES = ["image/jpeg", "image/png", "image/tiff"] as const;
export type ImageMediaType = (typeof IMAGE_MEDIA_TYPES)[number];
export const IMAGE_MAX_BYTES = 300 * 1024 * 1024;
export const IMAGE_MAX_PIXELS = 400_000_000;
export const TILE_SIZE_PX = 512;
