import type { CalibrationContent } from "./calibration-schemas";
import type { ImageState } from "./constants";
import type { MarkContent } from "./mark-schemas";

/** A mark as the bench shows it; `number` is the version that a change answers to. */
export type BenchMark = {
  id: string;
  label: string;
  versionId: string;
  number: number;
  content: MarkContent;
  /** Text beside it on the picture. */
  caption: string;
  by: string;
  at: string;
};

export type BenchScale = {
  id: string;
  label: string;
  number: number;
  content: CalibrationContent;
  /** "0.0440 ± 0.0003 mm" */
  pixelText: string;
  by: string;
  at: string;
};

/** Everything on a picture that can change while it is open. */
export type BenchState = {
  state: ImageState;
  /** Why it was refused; null otherwise. */
  refusal: string | null;
  /** Null until the server has looked into the file. */
  widthPx: number | null;
  heightPx: number | null;
  scale: BenchScale | null;
  marks: BenchMark[];
  deleted: BenchMark[];
  /** Why this person may not do it; null where they may. */
  mayNotMark: string | null;
  mayNotCalibrate: string | null;
};

/** What stands about a picture beside its marks. */
export type BenchPicture = {
  id: string;
  caseId: string;
  caseNumber: string | null;
  label: string;
  title: string;
  /** "E1.1 · Stereo microscope · 20 Nov 2026" */
  facts: string;
  fileUmPerPx: { x: number; y: number } | null;
};

export type FilmPicture = {
  id: string;
  label: string;
  title: string;
  /** Recorded magnification, "×500"; empty where none was recorded. */
  magnification: string;
  state: ImageState;
};
